import type { Criterion, CriterionMark, TakenReading } from "@/lib/core/tasks/types";

/** A value well inside the limits, the middle where there are two. */
function goodValue(reading: NonNullable<Criterion["reading"]>): number {
  const { lower, upper, resolution } = reading;
  const value = lower !== null && upper !== null ? (lower + upper) / 2 : lower !== null ? lower + 20 * resolution : (upper ?? 0) * 0.6;
  return Math.round(value / resolution) * resolution;
}

const tidy = (value: number): number => Number(value.toFixed(4));

function takenReading(criterion: Criterion, instruments: ReadonlyMap<string, string>, value: number): TakenReading {
  const kind = criterion.reading?.instrumentKind ?? null;
  const instrumentId = kind === null ? null : (instruments.get(kind) ?? null);
  return { value: tidy(value), unit: criterion.reading?.unit ?? "", instrumentId, instrumentInDate: instrumentId === null ? null : true };
}

/** A sheet on which everything was met. @param instruments kind → id of one that is in date */
export function metSheet(criteria: Criterion[], instruments: ReadonlyMap<string, string>): CriterionMark[] {
  return criteria.map((criterion) => ({
    key: criterion.key,
    mark: "met",
    reading: criterion.reading ? takenReading(criterion, instruments, goodValue(criterion.reading)) : null,
    prompts: 0,
    remark: "",
  }));
}

/** The same with one thing against it: the first *set* reading a little outside, or else the first required criterion not yet. */
export function notYetSheet(criteria: Criterion[], instruments: ReadonlyMap<string, string>): CriterionMark[] {
  const spoiled = criteria.find((criterion) => criterion.reading?.mode === "set") ?? criteria.find((criterion) => criterion.required);
  return metSheet(criteria, instruments).map((mark) => {
    if (mark.key !== spoiled?.key) return mark;
    const { reading } = spoiled;
    if (reading?.mode !== "set") return { ...mark, mark: "not_yet", remark: "Needs to be done without looking at the card." };
    const outside = reading.upper !== null ? reading.upper + 5 * reading.resolution : (reading.lower ?? 0) - 5 * reading.resolution;
    return { ...mark, mark: "not_yet", reading: takenReading(spoiled, instruments, outside), remark: "Check the setting before you tighten." };
  });
}
