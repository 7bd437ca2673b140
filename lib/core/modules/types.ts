import type { Question } from "@/lib/core/questions/types";
import type { Step } from "@/lib/core/steps/types";

/** Knowledge rule: at least `share` (0–1) of all questions right, safety-critical ones always, every step seen. */
export type PassRule = { share: number };

export type ModuleStep = Step & { recordingId: string };

/** What a published revision freezes. It is the work, not the media files: blurring a face later doesn't change its hash. */
export type ModuleContent = {
  title: string;
  summary: string;
  steps: ModuleStep[];
  questions: Question[];
  passRule: PassRule;
  taskIds: string[];
};
