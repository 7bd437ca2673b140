import { z } from "zod";
import { questionSchema } from "@/lib/schemas/questions";
import { stepSchema } from "@/lib/schemas/steps";

export const MOST_STEPS = 400;
export const MOST_QUESTIONS = 600;

/** The marking out as a whole, on top of the version that it began from. */
export const markingSchema = z.strictObject({
  version: z.int().min(0),
  steps: z.array(stepSchema).max(MOST_STEPS),
  questions: z.array(questionSchema).max(MOST_QUESTIONS),
});
export type MarkingInput = z.infer<typeof markingSchema>;

const savedSchema = z.object({ savedAt: z.iso.datetime().nullable(), savedBy: z.string().nullable() });

/** The marking out with who saved it last, and when. */
export const markingViewSchema = markingSchema.extend(savedSchema.shape);
export type MarkingView = z.infer<typeof markingViewSchema>;

/** What a save answers with. */
export const markingSavedSchema = z.object({ version: z.int() });

export const importMarkingSchema = z
  .strictObject({
    version: z.int().min(0),
    /** A chapters track, whose cues become the steps; null to keep the steps as they are. */
    chapters: z.string().max(1_500_000).nullable(),
    /** A metadata track with facts and questions; null to keep those of steps that stay. */
    marking: z.string().max(3_000_000).nullable(),
  })
  .refine((files) => files.chapters !== null || files.marking !== null, "Give at least one file.");
export type ImportMarkingInput = z.infer<typeof importMarkingSchema>;
