import { z } from "zod";
import type { QuestionBody } from "@/lib/core/questions/types";
import { lineOfText, plainText as text } from "@/lib/schemas/plain-text";
import { MAX_MS } from "@/lib/schemas/steps";

const id = lineOfText(60).min(1);

/** What is asked and what is right, by kind. What isn't named here is refused. */
export const questionBodySchema: z.ZodType<QuestionBody> = z.discriminatedUnion("kind", [
  z.strictObject({
    kind: z.literal("one_of"),
    choices: z.array(z.strictObject({ id, text: text(300), right: z.boolean(), why: text(300) })).max(12),
  }),
  z.strictObject({
    kind: z.literal("number"),
    unit: z.string().min(1).max(20),
    value: z.number(),
    tolerance: z.number().min(0),
    slips: z.array(z.strictObject({ value: z.number(), hint: text(300) })).max(12),
  }),
  z.strictObject({
    kind: z.literal("put_in_order"),
    items: z.array(z.strictObject({ id, text: text(300) })).max(20),
    neverBefore: z.array(z.tuple([id, id])).max(40),
  }),
]);

/** One question as it is kept, with its answer. */
export const questionSchema = z.strictObject({
  id: z.uuid(),
  stepId: z.uuid(),
  atMs: z.int().min(0).max(MAX_MS),
  prompt: text(500).min(1, "Write the question."),
  explanation: text(1000),
  lookAgainMs: z.int().min(0).max(MAX_MS),
  safetyCritical: z.boolean(),
  body: questionBodySchema,
});
