import { z } from "zod";
import { CAUTION_GRADES, type StepFacts } from "@/lib/core/steps/types";
import { lineOfText as text } from "@/lib/schemas/plain-text";

const id = text(60).min(1);

const tighteningSchema = z.strictObject({
  entered: text(80).min(1),
  newtonMetres: z.number().nonnegative().max(100_000),
  angleDegrees: z.number().nonnegative().max(3600).nullable(),
  source: text(300),
});

const fastenerSchema = z.strictObject({
  id,
  name: text(120).min(1, "Name the fastener."),
  count: z.int().min(1).max(200),
  acrossFlatsMm: z.number().positive().max(200).nullable(),
  oneTimeUse: z.boolean(),
  tightening: tighteningSchema.nullable(),
});

const cautionSchema = z.strictObject({
  id,
  grade: z.enum(CAUTION_GRADES),
  sign: z.string().regex(/^[WMP]\d{3}$/, "Choose a sign."),
  hazard: text(200).min(1, "Say what can hurt."),
  instruction: text(400).min(1, "Say what to do."),
  waitSeconds: z.int().positive().max(86_400).nullable(),
});

/** Facts of a step. What isn't named here is refused. */
export const stepFactsSchema: z.ZodType<StepFacts> = z.strictObject({
  fasteners: z.array(fastenerSchema).max(50),
  tools: z.array(text(120).min(1)).max(50),
  parts: z.array(text(120).min(1)).max(50),
  fluids: z.array(z.strictObject({ kind: text(120).min(1), amount: text(60) })).max(20),
  cautions: z.array(cautionSchema).max(20),
  faultCodes: z.array(z.string().regex(/^[PCBU][0-3][0-9A-F]{3}$/, "A fault code is like P0301.")).max(50),
});

/** A day: longer than any film of a job. */
export const MAX_MS = 24 * 3600 * 1000;

/** One step as it is kept. */
export const stepSchema = z.strictObject({
  id: z.uuid(),
  title: text(200).min(1, "Name the step."),
  startMs: z.int().min(0).max(MAX_MS),
  endMs: z.int().min(1).max(MAX_MS),
  facts: stepFactsSchema,
});
