import { limitsText } from "@/components/practice/criteria-list";
import { Tag, Value } from "@/components/ui/tag";
import type { Criterion, CriterionMark } from "@/lib/core/tasks/types";
import { formatValue } from "@/lib/core/units/format-value";

const MARK_LABEL = { met: "met", not_yet: "not yet", not_seen: "not seen" } as const;

/** The sheet as it was signed, criterion by criterion. */
export function SignedCriteria({ criteria, marks }: { criteria: Criterion[]; marks: CriterionMark[] }) {
  const byKey = new Map(marks.map((mark) => [mark.key, mark]));
  return (
    <ol>
      {criteria.map((criterion) => {
        const mark = byKey.get(criterion.key);
        return (
          <li key={criterion.key} className="border-b border-rule py-2.5 last:border-b-0">
            <div className="flex flex-wrap items-baseline justify-between gap-x-4 gap-y-1">
              <span className="flex-1 basis-64 font-semibold">
                {criterion.text} {criterion.safetyCritical && <Tag kind="safety">safety</Tag>}
              </span>
              <Tag kind={mark?.mark === "met" ? "strong" : "plain"}>{mark?.mark ? MARK_LABEL[mark.mark] : "not reached"}</Tag>
            </div>
            {criterion.reading && mark?.reading && (
              <p>
                {criterion.reading.quantity}:{" "}
                <Value>{formatValue(mark.reading.value, mark.reading.unit, criterion.reading.resolution)}</Value>{" "}
                <span className="text-ink2">
                  ({criterion.reading.mode}; limits {limitsText(criterion.reading)}
                  {mark.reading.instrumentInDate === false && "; instrument out of date"})
                </span>
              </p>
            )}
            {mark && mark.prompts > 0 && <p className="text-ink2">{mark.prompts} {mark.prompts === 1 ? "prompt" : "prompts"}</p>}
            {mark?.remark && <p className="text-ink2">{mark.remark}</p>}
          </li>
        );
      })}
    </ol>
  );
}
