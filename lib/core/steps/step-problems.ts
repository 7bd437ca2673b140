import type { Step } from "@/lib/core/steps/types";

type Stretch = Pick<Step, "title" | "startMs" | "endMs">;

/** What is wrong with the steps of one recording: name, length, overlap, past the end. Sentences; empty when nothing is. @param durationMs whole ms */
export function stepProblems(steps: readonly Stretch[], durationMs: number): string[] {
  const problems: string[] = [];
  let furthest: Stretch | undefined;
  for (const step of steps.toSorted((a, b) => a.startMs - b.startMs || a.endMs - b.endMs)) {
    const name = step.title.trim() === "" ? "A step" : `“${step.title}”`;
    if (step.title.trim() === "") problems.push("A step has no name.");
    if (!Number.isInteger(step.startMs) || !Number.isInteger(step.endMs)) problems.push(`${name} does not begin and end on a whole millisecond.`);
    if (step.endMs <= step.startMs) problems.push(`${name} ends before it begins.`);
    if (step.startMs < 0) problems.push(`${name} begins before the film.`);
    if (step.endMs > durationMs) problems.push(`${name} runs past the end of the film.`);
    if (furthest && step.startMs < furthest.endMs) problems.push(`${name} begins before “${furthest.title}” ends.`);
    if (!furthest || step.endMs > furthest.endMs) furthest = step;
  }
  return problems;
}
