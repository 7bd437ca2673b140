import { Tag, Value } from "@/components/ui/tag";
import { formatValue } from "@/lib/core/units/format-value";
import type { Criterion, ReadingSpec } from "@/lib/core/tasks/types";

const KIND = { seen: "seen", measured: "measured", asked: "asked", inspected: "inspected afterwards" } as const;

/** Limits as they are read out: "100.8 to 109.2 N·m", "at most 0.05 mm". */
export function limitsText(spec: ReadingSpec): string {
  const text = (value: number) => formatValue(value, spec.unit, spec.resolution);
  if (spec.lower !== null && spec.upper !== null) return `${text(spec.lower)} to ${text(spec.upper)}`;
  if (spec.lower !== null) return `at least ${text(spec.lower)}`;
  if (spec.upper !== null) return `at most ${text(spec.upper)}`;
  return "no limits";
}

/** What will be looked at, word for word as the assessor has it. */
export function CriteriaList({ criteria }: { criteria: Criterion[] }) {
  return (
    <ol className="grid">
      {criteria.map((criterion) => (
        <li key={criterion.key} className="border-b border-rule py-3 last:border-b-0">
          <p className="font-semibold">
            {criterion.text} {criterion.safetyCritical && <Tag kind="safety">safety</Tag>}
          </p>
          <p className="text-ink2">
            {KIND[criterion.kind]}
            {criterion.metLooksLike && ` · ${criterion.metLooksLike}`}
            {!criterion.required && !criterion.safetyCritical && " · optional"}
          </p>
          {criterion.reading && (
            <p>
              {criterion.reading.quantity}: <Value>{limitsText(criterion.reading)}</Value>{" "}
              <span className="text-ink2">{criterion.reading.mode === "set" ? "(you set it)" : "(you find it)"}</span>
            </p>
          )}
        </li>
      ))}
    </ol>
  );
}
