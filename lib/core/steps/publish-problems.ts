import { FAULT_CODE } from "@/lib/core/fault-codes/decode-fault-codes";
import { SIGNS } from "@/lib/core/steps/iso-7010";
import type { Step } from "@/lib/core/steps/types";

/**
 * What keeps a step's facts from being published: a draft may hold it, a revision may not. A value that doesn't say where it comes from
 * could be of another vehicle; a caution has to name its hazard, say what to do, and bear a sign that exists.
 * @returns sentences; empty when nothing does
 */
export function stepPublishProblems({ title, facts }: Pick<Step, "title" | "facts">): string[] {
  const problems: string[] = [];
  for (const { name, tightening } of facts.fasteners) {
    if (!tightening) continue;
    if (tightening.source.trim() === "") problems.push(`say where the tightening value of “${name}” comes from.`);
    if (!(tightening.newtonMetres > 0)) problems.push(`the tightening value of “${name}” is not understood.`);
  }
  for (const { sign, hazard, instruction } of facts.cautions) {
    if (hazard.trim() === "") problems.push("a caution does not say what can hurt.");
    if (instruction.trim() === "") problems.push(`the caution “${hazard}” does not say what to do.`);
    if (!Object.hasOwn(SIGNS, sign)) problems.push(`the sign ${sign} of “${hazard}” is not on the list.`);
  }
  for (const code of facts.faultCodes) if (!FAULT_CODE.test(code)) problems.push(`“${code}” is not a fault code.`);
  return problems.map((problem) => `“${title}”: ${problem}`);
}
