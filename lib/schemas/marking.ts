import { z } from "zod";
import { questionSchema } from "@/lib/schemas/questions";
import { stepSchema } from "@/lib/schemas/steps";

export const markingSchema = z.object({
  version: z.int().min(0),
  steps: z.array(stepSchema).max(400),
  questions: z.array(questionSchema).max(600),
});
export type MarkingInput = z.infer<typeof markingSchema>;

export const importMarkingSchema = z.object({
  version: z.int().min(0),
  /** A chapters track; its cues become the steps. */
  chapters: z.string().max(2_000_000),
  /** A metadata track with facts and questions, or null to keep those of steps that stay. */
  marking: z.string().max(3_000_000).nullable(),
});
export type ImportMarkingInput = z.infer<typeof importMarkingSchema>;
