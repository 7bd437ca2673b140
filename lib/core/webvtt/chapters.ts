import { cuePlainText, escapeCueText } from "@/lib/core/webvtt/cue-text";
import { readVtt, type Cue, type LineProblem } from "@/lib/core/webvtt/read-vtt";
import { formatTimestamp } from "@/lib/core/webvtt/timestamps";

export type Chapter = { id: string; title: string; startMs: number; endMs: number };

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
  const found = [...problems];
  cues.forEach((cue, index) => found.push(...cueProblems(cue, cues[index - 1], durationMs)));
  found.push(...overlapProblems(cues));
  if (found.length > 0) return { problems: unique(found) };
  return { chapters: cues.map(({ id, startMs, endMs, text: title }) => ({ id, title: cuePlainText(title), startMs, endMs })) };
}

function cueProblems(cue: Cue, before: Cue | undefined, durationMs: number): LineProblem[] {
  const problem = (message: string): LineProblem => ({ line: cue.line, message });
  return [
    ...(cue.endMs <= cue.startMs ? [problem("This step ends before it begins.")] : []),
    ...(cue.endMs > durationMs ? [problem(`This step runs past the end of the film (${formatTimestamp(durationMs)}).`)] : []),
    ...(before && cue.startMs < before.startMs ? [problem("Steps stand in the order of the film: this one begins before the one above it.")] : []),
    ...(cuePlainText(cue.text).trim() === "" ? [problem("This step has no name.")] : []),
    ...(cue.text.includes("\n") ? [problem("A step's name is one line.")] : []),
    ...(cue.text.includes("<") ? [problem("A step's name holds no markup; write &lt; for <.")] : []),
  ];
}

/** Pairs that share time. In the standard's words, any two must be disjoint or one within the other; our steps must be disjoint. */
export function overlapProblems(cues: readonly Cue[]): LineProblem[] {
  const sorted = cues.toSorted((a, b) => a.startMs - b.startMs || b.endMs - a.endMs);
  const problems: LineProblem[] = [];
  let furthest: Cue | undefined;
  for (const cue of sorted) {
    if (furthest && cue.startMs < furthest.endMs) {
      const within = cue.endMs <= furthest.endMs;
      const message = within
        ? `This step lies inside the one on line ${furthest.line}; steps follow one another.`
        : `This step begins before the one on line ${furthest.line} ends.`;
      problems.push({ line: cue.line, message });
    }
    if (!furthest || cue.endMs > furthest.endMs) furthest = cue;
  }
  return problems;
}

const unique = (problems: LineProblem[]): LineProblem[] =>
  [...new Map(problems.map((problem) => [`${problem.line} ${problem.message}`, problem])).values()].toSorted((a, b) => a.line - b.line);
