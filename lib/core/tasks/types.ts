export const CRITERION_KINDS = ["seen", "measured", "asked", "inspected"] as const;
export type CriterionKind = (typeof CRITERION_KINDS)[number];

/** `set`: the apprentice made it so, the limits decide. `found`: the state of the vehicle, right measuring and conclusion decide. */
export type ReadingSpec = {
  mode: "set" | "found";
  quantity: string;
  unit: string;
  lower: number | null;
  upper: number | null;
  resolution: number;
  instrumentKind: string | null;
};

export type Criterion = {
  key: string;
  group: string;
  kind: CriterionKind;
  text: string;
  metLooksLike: string;
  required: boolean;
  safetyCritical: boolean;
  reading: ReadingSpec | null;
};

export const LEVELS = [1, 2, 3, 4, 5] as const;
export type Level = (typeof LEVELS)[number];

/** Supervision levels in the trade's words (product: "supervision level"). */
export const LEVEL_LABEL: Record<Level, string> = {
  1: "watching",
  2: "helping",
  3: "hands on, mentor alongside",
  4: "alone, checked before the vehicle leaves",
  5: "alone",
};

/** What must be there before a level may be given, counting this observation. */
export type LevelNeed = { level: Level; observations: number; vehicles: number; assessors: number };

export type TaskRule = {
  practiceRuns: number;
  evidencePhotos: number;
  independence: boolean;
  licence: string | null;
  minimumAgeAlone: number | null;
  currencyMonths: number;
  levelNeeds: LevelNeed[];
};

export type TaskContent = {
  title: string;
  shortTitle: string;
  area: string;
  conditions: string;
  criteria: Criterion[];
  rule: TaskRule;
};

export const MARKS = ["met", "not_yet", "not_seen"] as const;
export type Mark = (typeof MARKS)[number];

export type TakenReading = { value: number; unit: string; instrumentId: string | null; instrumentInDate: boolean | null };

/** What the assessor put down for one criterion. */
export type CriterionMark = { key: string; mark: Mark | null; reading: TakenReading | null; prompts: number; remark: string };

export type Outcome = "met" | "not_yet";
