import { readVtt, type LineProblem } from "@/lib/core/webvtt/read-vtt";

/** SubRip as WebVTT: the comma of its times becomes a point; counters stay as cue ids. Text that is WebVTT already comes back as it is. */
export function srtToVtt(text: string): string {
  const plain = text.replace(/^\uFEFF/, "").replace(/\r\n?/g, "\n");
  if (plain.startsWith("WEBVTT")) return plain;
  const timed = plain.replace(/^(\d{1,2}:\d{2}:\d{2}),(\d{3}) --> (\d{1,2}:\d{2}:\d{2}),(\d{3})/gm, (_, from, fromMs, to, toMs) => {
    const two = (time: string) => time.padStart(8, "0");
    return `${two(from)}.${fromMs} --> ${two(to)}.${toMs}`;
  });
  return `WEBVTT\n\n${timed.trim()}\n`;
}

/** Reads captions from WebVTT or SubRip for keeping: whole or not at all. */
export function readCaptions(text: string, durationMs: number): { vtt: string } | { problems: LineProblem[] } {
  const vtt = srtToVtt(text);
  const { cues, problems } = readVtt(vtt);
  const late = cues
    .filter((cue) => cue.startMs >= durationMs)
    .map((cue): LineProblem => ({ line: cue.line, message: "This caption begins after the end of the film." }));
  const empty = cues.length === 0 && problems.length === 0 ? [{ line: 1, message: "There are no captions in this file." }] : [];
  const found = [...problems, ...late, ...empty];
  const moved = movedLines(text);
  return found.length > 0 ? { problems: found.map(({ line, message }) => ({ line: Math.max(1, line - moved), message })) } : { vtt };
}

/** How many lines further down a line of SubRip stands once it is WebVTT: a problem is told by its line in the file that was given. */
function movedLines(text: string): number {
  const plain = text.replace(/^\uFEFF/, "").replace(/\r\n?/g, "\n");
  if (plain.startsWith("WEBVTT")) return 0;
  const leading = /^\s*/.exec(plain)?.[0] ?? "";
  return 2 - (leading.match(/\n/g)?.length ?? 0);
}
