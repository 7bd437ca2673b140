import { judgeReading } from "@/lib/core/tasks/judge-reading";
import type { Criterion, CriterionMark, Outcome, TaskContent } from "@/lib/core/tasks/types";

export type ObservationOutcome = {
  outcome: Outcome;
  /** Why it is not yet: one sentence for each criterion that stands against it. Empty when met. */
  reasons: { key: string; text: string }[];
  /** Criteria that nothing was put down for; a sheet with any can't be signed. */
  missing: string[];
};

/** Safety-critical criteria are required whatever the task's author ticked. */
const isRequired = (criterion: Criterion): boolean => criterion.required || criterion.safetyCritical;

/**
 * The outcome of a sheet: met needs every required criterion met. "Not seen" is never met, a reading that was asked for must have been
 * taken, a *set* one decides for itself, and work that was stopped for safety is not yet, whatever else was seen; what was not reached then need not be filled in.
 */
export function observationOutcome(content: TaskContent, marks: CriterionMark[], stoppedReason: string | null): ObservationOutcome {
  const byKey = new Map(marks.map((mark) => [mark.key, mark]));
  const reasons: ObservationOutcome["reasons"] = stoppedReason === null ? [] : [{ key: "", text: `Stopped for safety: ${stoppedReason}` }];
  const missing: string[] = [];
  for (const criterion of content.criteria) {
    const mark = byKey.get(criterion.key);
    if (!mark || mark.mark === null) {
      if (stoppedReason === null) missing.push(criterion.key);
      continue;
    }
    const reason = isRequired(criterion) ? reasonAgainst(criterion, mark) : null;
    if (reason) reasons.push({ key: criterion.key, text: `${criterion.text}: ${reason}` });
  }
  return { outcome: reasons.length === 0 && missing.length === 0 ? "met" : "not_yet", reasons, missing };
}

function reasonAgainst(criterion: Criterion, mark: CriterionMark): string | null {
  if (mark.mark === "not_seen") return "not seen.";
  const judged = criterion.reading && mark.reading ? judgeReading(criterion.reading, mark.reading) : null;
  if (judged && !judged.canBeMet) return judged.sentence;
  if (mark.mark === "not_yet") return mark.remark === "" ? "not yet." : `not yet. ${mark.remark}`;
  if (criterion.reading && !mark.reading) return "no reading was taken.";
  return null;
}
