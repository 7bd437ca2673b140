import { escapeCueText } from "@/lib/core/webvtt/cue-text";
import { inFileOrder } from "@/lib/core/webvtt/line-problems";
import { readVtt, type LineProblem } from "@/lib/core/webvtt/read-vtt";
import { formatTimestamp } from "@/lib/core/webvtt/timestamps";

/** What is said in [startMs, endMs): plain text, lines parted by \n. Times in whole ms. */
export type Caption = { startMs: number; endMs: number; text: string };

/** Captions as a WebVTT track. What would be markup is escaped; blank lines, which would end a cue, are left out. */
export function writeCaptions(captions: readonly Caption[]): string {
  const cues = captions.map(({ startMs, endMs, text }) => {
    const lines = text.split(/\r\n?|\n/).filter((line) => line.trim() !== "");
    return `\n${formatTimestamp(startMs)} --> ${formatTimestamp(endMs)}\n${lines.map((line) => `${escapeCueText(line)}\n`).join("")}`;
  });
  return `WEBVTT\n${cues.join("")}`;
}

const isVtt = (text: string): boolean => /^\uFEFF?WEBVTT/.test(text);

// Hours of one digit, a point for the comma, and a place on the picture after the times are all found in files that are about.
const SRT_TIMING = /^\s*(\d{1,2}:\d{2}:\d{2})[,.](\d{3})\s*-->\s*(\d{1,2}:\d{2}:\d{2})[,.](\d{3})(?:\s.*)?$/;
/** Tags that SubRip has; any other < is a sign of its own. */
const SRT_TAG = /<(?!\/?(?:[biu]|font\b[^>]*)>)/gi;

/**
 * SubRip as WebVTT, each line two lines further down: times are turned, counters stay as ids, font tags and placing marks go, and a <
 * or an arrow in the words is escaped. Text that is WebVTT already comes back as it is. SubRip has no standard; common practice, no source.
 */
export function srtToVtt(text: string): string {
  if (isVtt(text)) return text;
  const lines = text.replace(/^\uFEFF/, "").split(/\r\n?|\n/);
  const turned = lines.map((line) => {
    const [, from, fromMs, to, toMs] = SRT_TIMING.exec(line) ?? [];
    if (from && to) return `${from.padStart(8, "0")}.${fromMs} --> ${to.padStart(8, "0")}.${toMs}`;
    const words = line.replace(/\{\\[^}]*\}/g, "").replace(SRT_TAG, "&lt;").replace(/<\/?font\b[^>]*>/gi, "");
    // A line that held nothing but marks must not end its caption.
    return line.trim() === "" ? "" : words.trim() === "" ? "&nbsp;" : words.replaceAll("-->", "--&gt;");
  });
  return `WEBVTT\n\n${turned.join("\n")}`;
}

/** Reads captions from WebVTT or SubRip for keeping: whole or not at all. Problems bear the lines of the file that was given. */
export function readCaptions(text: string, durationMs: number): { vtt: string } | { problems: LineProblem[] } {
  const vtt = srtToVtt(text);
  const { cues, problems } = readVtt(vtt);
  const late = cues
    .filter((cue) => cue.startMs >= durationMs)
    .map((cue): LineProblem => ({ line: cue.line, message: "This caption begins after the end of the film." }));
  const empty = cues.length === 0 && problems.length === 0 ? [{ line: 1, message: "There are no captions in this file." }] : [];
  const moved = isVtt(text) ? 0 : 2;
  const found = [...problems, ...late, ...empty].map(({ line, message }) => ({ line: Math.max(1, line - moved), message }));
  return found.length > 0 ? { problems: inFileOrder(found) } : { vtt };
}
