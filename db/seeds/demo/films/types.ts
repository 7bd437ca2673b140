import type { Question } from "@/lib/core/questions/types";
import type { Caution, Step } from "@/lib/core/steps/types";

/** What stands beside the picture from the moment its line is spoken until the scene ends: a value in large figures, or a few words. */
export type Plate = { kind: "value"; label: string; value: string; unit: string; note?: string } | { kind: "note"; text: string };

/** One narrated sentence or two. `key` is how questions name it; `holdMs` is quiet after it, for looking. */
export type Line = { text: string; key?: string; plates?: Plate[]; holdMs?: number };

/** `picture` names a drawing of the film command; it gets the scene's line and how far the line is. */
export type Scene = { picture: string; caution?: Caution; lines: Line[] };

export type StepScript = { key: string; title: string; scenes: Scene[] };

export type FilmScript = {
  key: string;
  title: string;
  vehicle: string;
  mentor: string;
  voice: { name: string; wordsPerMinute: number };
  summary: string;
  steps: StepScript[];
};

/** Where everything came to lie once the sentences were spoken and measured. Whole milliseconds from the film's first frame. */
export type FilmTimings = {
  film: string;
  durationMs: number;
  steps: { key: string; title: string; startMs: number; endMs: number }[];
  scenes: { step: string; picture: string; startMs: number; endMs: number }[];
  lines: { key: string; step: string; text: string; startMs: number; endMs: number }[];
};

/** A question before the film's times are known: asked when the line `after` has been spoken, looked up again where `lookAgain` begins. */
export type QuestionDraft = Pick<Question, "prompt" | "explanation" | "safetyCritical" | "body"> & {
  key: string;
  after: string;
  lookAgain: string;
};

export type MarkingOut = { steps: Step[]; questions: Question[] };
