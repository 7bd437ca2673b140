import { z } from "zod";
import type { QuestionBody } from "@/lib/core/questions/types";

const text = (most: number) => z.string().trim().max(most);
const id = z.string().min(1).max(60);

export const questionBodySchema: z.ZodType<QuestionBody> = z.discriminatedUnion("kind", [
  z.object({
    kind: z.literal("one_of"),
    choices: z.array(z.object({ id, text: text(300), right: z.boolean(), why: text(300) })).max(12),
  }),
  z.object({
    kind: z.literal("number"),
    unit: z.string().min(1).max(20),
    value: z.number(),
    tolerance: z.number().min(0),
    slips: z.array(z.object({ value: z.number(), hint: text(300) })).max(12),
  }),
  z.object({
    kind: z.literal("put_in_order"),
    items: z.array(z.object({ id, text: text(300) })).max(20),
    neverBefore: z.array(z.tuple([id, id])).max(40),
  }),
]);

const MAX_MS = 24 * 3600 * 1000;

export const questionSchema = z.object({
  id: z.uuid(),
  stepId: z.uuid(),
  atMs: z.int().min(0).max(MAX_MS),
  prompt: text(500).min(1, "Write the question."),
  explanation: text(1000),
  lookAgainMs: z.int().min(0).max(MAX_MS),
  safetyCritical: z.boolean(),
  body: questionBodySchema,
});
