import type { Criterion, LevelNeed, ReadingSpec, TaskRule } from "@/lib/core/tasks/types";

type More = { critical?: boolean; optional?: boolean };

const criterion =
  (kind: Criterion["kind"]) =>
  (key: string, group: string, text: string, metLooksLike: string, more: More = {}): Criterion => ({
    key,
    group,
    kind,
    text,
    metLooksLike,
    required: more.optional !== true,
    safetyCritical: more.critical === true,
    reading: null,
  });

export const seen = criterion("seen");
export const asked = criterion("asked");
export const inspected = criterion("inspected");

/** A criterion with a reading. */
export const measured = (key: string, group: string, text: string, metLooksLike: string, reading: ReadingSpec, more: More = {}): Criterion => ({
  ...criterion("measured")(key, group, text, metLooksLike, more),
  reading,
});

type Limits = { lower?: number; upper?: number; resolution: number; instrument?: string };

const reading =
  (mode: ReadingSpec["mode"]) =>
  (quantity: string, unit: string, { lower, upper, resolution, instrument }: Limits): ReadingSpec => ({
    mode,
    quantity,
    unit,
    lower: lower ?? null,
    upper: upper ?? null,
    resolution,
    instrumentKind: instrument ?? null,
  });

export const set = reading("set");
export const found = reading("found");

/** The demo's house rule for click wrenches: ±4 % of the value, to a tenth. */
export const torque = (newtonMetres: number): ReadingSpec =>
  set("tightening value", "N·m", {
    lower: Math.round(newtonMetres * 9.6) / 10,
    upper: Math.round(newtonMetres * 10.4) / 10,
    resolution: 0.1,
    instrument: "torque wrench",
  });

// Level 4 and 5 on safety-critical work: three observations, two assessors, two vehicles (the demo scenario; common practice, no source).
const CRITICAL_NEEDS: LevelNeed[] = [
  { level: 4, observations: 3, vehicles: 2, assessors: 2 },
  { level: 5, observations: 4, vehicles: 3, assessors: 2 },
];
const PLAIN_NEEDS: LevelNeed[] = [
  { level: 4, observations: 2, vehicles: 2, assessors: 1 },
  { level: 5, observations: 3, vehicles: 2, assessors: 2 },
];

const PLAIN_RULE: TaskRule = {
  practiceRuns: 1,
  evidencePhotos: 1,
  independence: false,
  licence: null,
  minimumAgeAlone: null,
  currencyMonths: 24,
  levelNeeds: PLAIN_NEEDS,
};

/** Work whose failure shows at once and on the bench. */
export const plainRule = (more: Partial<TaskRule> = {}): TaskRule => ({ ...PLAIN_RULE, ...more });

/** Brakes, steering, lifting, wheels: an independent assessor, nobody under 18 alone, and a yearly re-check. */
export const criticalRule = (more: Partial<TaskRule> = {}): TaskRule => ({
  ...PLAIN_RULE,
  practiceRuns: 2,
  evidencePhotos: 2,
  independence: true,
  minimumAgeAlone: 18,
  currencyMonths: 12,
  levelNeeds: CRITICAL_NEEDS,
  ...more,
});
