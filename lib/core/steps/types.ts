/** A tightening value. `entered` is what the mentor typed and is kept; the numbers are what it means. No source, no publishing. */
export type Tightening = {
  entered: string;
  newtonMetres: number;
  angleDegrees: number | null;
  source: string;
};

export type Fastener = {
  id: string;
  name: string;
  count: number;
  acrossFlatsMm: number | null;
  oneTimeUse: boolean;
  tightening: Tightening | null;
};

export const CAUTION_GRADES = ["caution", "warning", "danger"] as const;
export type CautionGrade = (typeof CAUTION_GRADES)[number];

/** Shown before the step that needs it. One sentence each: hazard, harm, what to do. `sign` is an ISO 7010 id such as "W017". */
export type Caution = {
  id: string;
  grade: CautionGrade;
  sign: string;
  hazard: string;
  instruction: string;
  waitSeconds: number | null;
};

/** Facts of one step. `source` of values defaults to "maker's data for this vehicle". */
export type StepFacts = {
  fasteners: Fastener[];
  tools: string[];
  parts: string[];
  fluids: { kind: string; amount: string }[];
  cautions: Caution[];
  faultCodes: string[];
};

export const NO_FACTS: StepFacts = { fasteners: [], tools: [], parts: [], fluids: [], cautions: [], faultCodes: [] };

/** A named stretch of a recording: [startMs, endMs) in whole ms on the recording's own axis. */
export type Step = { id: string; title: string; startMs: number; endMs: number; facts: StepFacts };
