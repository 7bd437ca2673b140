import { SIGNS } from "@/lib/core/steps/iso-7010";
import type { Step } from "@/lib/core/steps/types";

/** What keeps a step's facts from being published: a draft may hold it, a revision may not. Sentences; empty when nothing does. */
export function stepPublishProblems(step: Step): string[] {
  const unsourced = step.facts.fasteners
    .filter((fastener) => fastener.tightening !== null && fastener.tightening.source.trim() === "")
    .map((fastener) => `“${step.title}”: say where the tightening value of “${fastener.name}” comes from.`);
  const unknownSigns = step.facts.cautions
    .filter((caution) => SIGNS[caution.sign] === undefined)
    .map((caution) => `“${step.title}”: the sign ${caution.sign} of “${caution.hazard}” is not on the list.`);
  return [...unsourced, ...unknownSigns];
}
