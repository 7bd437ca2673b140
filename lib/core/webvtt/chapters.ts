import { cuePlainText, escapeCueText } from "@/lib/core/webvtt/cue-text";
import { inFileOrder, repeatedIds } from "@/lib/core/webvtt/line-problems";
import { readVtt, type Cue, type LineProblem } from "@/lib/core/webvtt/read-vtt";
import { formatTimestamp } from "@/lib/core/webvtt/timestamps";

export type Chapter = { id: string; title: string; startMs: number; endMs: number };

/** What fits on one line of a step list. */
const LONGEST_TITLE = 200;

/** Steps as a WebVTT chapters track. Cue ids are the steps' own, so that the file finds its way back. */
export function writeChapters(chapters: readonly Chapter[]): string {
  const cues = chapters.map(
    ({ id, title, startMs, endMs }) => `\n${id}\n${formatTimestamp(startMs)} --> ${formatTimestamp(endMs)}\n${escapeCueText(title)}\n`,
  );
  return `WEBVTT\n${cues.join("")}`;
}

/**
 * Reads a chapters track as an author's file: strict, all or nothing.
 * @returns chapters in order, or every problem with its line. Steps of one recording are flat: nested chapters, which the standard
 *          allows, are refused here with a sentence of their own.
 * @source W3C WebVTT, "WebVTT file using chapter title text", "only nested cues"
 */
export function readChapters(text: string, durationMs: number): { chapters: Chapter[] } | { problems: LineProblem[] } {
  const { cues, problems } = readVtt(text);
  const found = [...problems, ...cues.flatMap((cue) => cueProblems(cue, durationMs)), ...overlapProblems(cues), ...repeatedIds(cues)];
  if (found.length > 0) return { problems: inFileOrder(found) };
  return { chapters: cues.map(({ id, startMs, endMs, text: title }) => ({ id, title: cuePlainText(title).trim(), startMs, endMs })) };
}

/** Order and length of the times are already among the file's own problems. */
function cueProblems(cue: Cue, durationMs: number): LineProblem[] {
  const title = cuePlainText(cue.text).trim();
  const at = (line: number, message: string): LineProblem => ({ line, message });
  return [
    ...(cue.endMs > durationMs ? [at(cue.line, `This step runs past the end of the film (${formatTimestamp(durationMs)}).`)] : []),
    ...(title === "" ? [at(cue.line, "This step has no name.")] : []),
    ...(title.length > LONGEST_TITLE ? [at(cue.line + 1, `A step's name has at most ${LONGEST_TITLE} characters.`)] : []),
    ...(cue.text.includes("\n") ? [at(cue.line + 2, "A step's name is one line.")] : []),
    ...(cue.text.includes("<") ? [at(cue.line + 1, "A step's name holds no markup; write &lt; for <.")] : []),
  ];
}

/**
 * Cues that share time with one before them, each told once. In the standard's words any two must be disjoint or one within the
 * other; our steps must be disjoint.
 */
export function overlapProblems(cues: readonly Cue[]): LineProblem[] {
  const sorted = cues.toSorted((a, b) => a.startMs - b.startMs || b.endMs - a.endMs);
  const problems: LineProblem[] = [];
  let furthest: Cue | undefined;
  for (const cue of sorted) {
    if (furthest && cue.startMs < furthest.endMs) {
      const message =
        cue.endMs <= furthest.endMs
          ? `This step lies inside the one on line ${furthest.line}; steps follow one another.`
          : `This step begins before the one on line ${furthest.line} ends.`;
      problems.push({ line: cue.line, message });
    }
    if (!furthest || cue.endMs > furthest.endMs) furthest = cue;
  }
  return problems;
}
