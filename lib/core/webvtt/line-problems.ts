import type { Cue, LineProblem } from "@/lib/core/webvtt/read-vtt";

/** Each problem once, in the order of the file. */
export const inFileOrder = (problems: readonly LineProblem[]): LineProblem[] =>
  [...new Map(problems.map((problem) => [`${problem.line} ${problem.message}`, problem])).values()].toSorted((a, b) => a.line - b.line);

/** Cues that bear an id which another one bears. Ids are how a file finds its way back, so each stands once. @source W3C WebVTT, "WebVTT cue identifier" */
export function repeatedIds(cues: readonly Cue[]): LineProblem[] {
  const first = new Map<string, Cue>();
  const problems: LineProblem[] = [];
  for (const cue of cues.toSorted((a, b) => a.line - b.line)) {
    const earlier = cue.id === "" ? undefined : first.get(cue.id);
    if (earlier) problems.push({ line: cue.line - 1, message: `The id “${cue.id}” was given above line ${earlier.line} already.` });
    else first.set(cue.id, cue);
  }
  return problems;
}
