import { z } from "zod";
import { CAUTION_GRADES, type StepFacts } from "@/lib/core/steps/types";

const text = (most: number) => z.string().trim().max(most);
const id = z.string().min(1).max(60);

const tighteningSchema = z.object({
  entered: text(80).min(1),
  newtonMetres: z.number().nonnegative(),
  angleDegrees: z.number().nonnegative().nullable(),
  source: text(300),
});

const fastenerSchema = z.object({
  id,
  name: text(120).min(1, "Name the fastener."),
  count: z.int().min(1).max(200),
  acrossFlatsMm: z.number().positive().max(200).nullable(),
  oneTimeUse: z.boolean(),
  tightening: tighteningSchema.nullable(),
});

const cautionSchema = z.object({
  id,
  grade: z.enum(CAUTION_GRADES),
  sign: z.string().regex(/^[WMP]\d{3}$/, "Choose a sign."),
  hazard: text(200).min(1, "Say what can hurt."),
  instruction: text(400).min(1, "Say what to do."),
  waitSeconds: z.int().positive().max(86_400).nullable(),
});

export const stepFactsSchema: z.ZodType<StepFacts> = z.object({
  fasteners: z.array(fastenerSchema).max(50),
  tools: z.array(text(120).min(1)).max(50),
  parts: z.array(text(120).min(1)).max(50),
  fluids: z.array(z.object({ kind: text(120).min(1), amount: text(60) })).max(20),
  cautions: z.array(cautionSchema).max(20),
  faultCodes: z.array(z.string().regex(/^[PCBU][0-3][0-9A-F]{3}$/, "A fault code is like P0301.")).max(50),
});

const MAX_MS = 24 * 3600 * 1000;

export const stepSchema = z.object({
  id: z.uuid(),
  title: text(200).min(1, "Name the step."),
  startMs: z.int().min(0).max(MAX_MS),
  endMs: z.int().min(1).max(MAX_MS),
  facts: stepFactsSchema,
});
