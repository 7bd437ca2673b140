import type { Step } from "@/lib/core/steps/types";

/** What is wrong with the steps of one recording: order, length, overlap, past the end. Sentences; empty when nothing is. */
export function stepProblems(steps: readonly Pick<Step, "title" | "startMs" | "endMs">[], durationMs: number): string[] {
  const problems: string[] = [];
  let before: Pick<Step, "title" | "startMs" | "endMs"> | undefined;
  for (const step of steps.toSorted((a, b) => a.startMs - b.startMs || a.endMs - b.endMs)) {
    const name = step.title.trim() === "" ? "A step" : `“${step.title}”`;
    if (step.title.trim() === "") problems.push("A step has no name.");
    if (step.endMs <= step.startMs) problems.push(`${name} ends before it begins.`);
    if (step.startMs < 0) problems.push(`${name} begins before the film.`);
    if (step.endMs > durationMs) problems.push(`${name} runs past the end of the film.`);
    if (before && step.startMs < before.endMs) problems.push(`${name} begins before “${before.title}” ends.`);
    before = step;
  }
  return problems;
}
