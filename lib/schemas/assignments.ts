import { z } from "zod";

const spanSchema = z.tuple([z.int().min(0), z.int().min(0)]);

export const reportSpansSchema = z.object({
  recordingId: z.uuid(),
  /** [startMs, endMs) on the recording's axis, as played since the last report. */
  spans: z.array(spanSchema).max(200),
  rate: z.number().positive().max(4),
});
export type ReportSpansInput = z.infer<typeof reportSpansSchema>;

export const knowledgeSchema = z.object({
  met: z.boolean(),
  stepsSeen: z.int(),
  steps: z.int(),
  right: z.int(),
  questions: z.int(),
  missing: z.array(z.string()),
});

export const learningProgressSchema = z.object({
  knowledge: knowledgeSchema,
  /** Share of each step that the server accepted as played, 0–1. */
  seen: z.record(z.uuid(), z.number()),
  /** What was accepted of each recording, united. */
  played: z.record(z.uuid(), z.array(spanSchema)),
});
export type LearningProgress = z.infer<typeof learningProgressSchema>;

const hiddenItems = z.array(z.object({ id: z.string(), text: z.string() }));

export const askedQuestionSchema = z.object({
  attemptId: z.uuid(),
  questionId: z.uuid(),
  prompt: z.string(),
  safetyCritical: z.boolean(),
  ask: z.discriminatedUnion("kind", [
    z.object({ kind: z.literal("one_of"), choices: hiddenItems }),
    z.object({ kind: z.literal("number"), unit: z.string() }),
    z.object({ kind: z.literal("put_in_order"), items: hiddenItems }),
  ]),
});

export const answerQuestionSchema = z.object({
  attemptId: z.uuid(),
  given: z.discriminatedUnion("kind", [
    z.object({ kind: z.literal("one_of"), choiceId: z.string().max(60) }),
    z.object({ kind: z.literal("number"), value: z.number().finite(), unit: z.string().min(1).max(20) }),
    z.object({ kind: z.literal("put_in_order"), itemIds: z.array(z.string().max(60)).max(50) }),
  ]),
});
export type AnswerQuestionInput = z.infer<typeof answerQuestionSchema>;

export const markedAnswerSchema = z.object({
  right: z.boolean(),
  /** What went wrong, or why it is right. */
  why: z.string().nullable(),
  /** Where to look again; null when right. */
  lookAgainMs: z.int().nullable(),
  knowledge: knowledgeSchema,
});
export type MarkedAnswer = z.infer<typeof markedAnswerSchema>;
