import type { FieldProblem } from "@/lib/core/errors";
import { parseTightening } from "@/lib/core/steps/parse-tightening";
import type { StepFacts } from "@/lib/core/steps/types";

/**
 * What the server makes of tightening values as they were typed. Numbers that came along are not believed but replaced.
 * @returns facts with its own numbers, and a problem, with its path inside the facts, for each value that it does not understand
 */
export function understandTightening(facts: StepFacts): { facts: StepFacts; problems: FieldProblem[] } {
  const problems: FieldProblem[] = [];
  const fasteners = facts.fasteners.map((fastener, index) => {
    if (!fastener.tightening) return fastener;
    const parsed = parseTightening(fastener.tightening.entered);
    if (!("problem" in parsed)) return { ...fastener, tightening: { ...fastener.tightening, ...parsed } };
    problems.push({ path: `fasteners.${index}.tightening.entered`, message: `${fastener.name}: ${parsed.problem}` });
    return fastener;
  });
  return { facts: { ...facts, fasteners }, problems };
}
