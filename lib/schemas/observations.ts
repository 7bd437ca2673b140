import { z } from "zod";
import { MARKS } from "@/lib/core/tasks/types";

export const startObservationSchema = z.object({
  apprenticeId: z.uuid(),
  taskId: z.uuid(),
  vehicle: z.string().trim().min(1, "Name the vehicle.").max(120),
  jobCardNumber: z.string().trim().min(1, "Give the job card's number.").max(40),
  /** Made by the device once per press, so that a press sent twice opens one sheet. */
  idempotencyKey: z.uuid(),
});
export type StartObservationInput = z.infer<typeof startObservationSchema>;

export const markCriterionSchema = z.object({
  mark: z.enum(MARKS).nullable(),
  reading: z
    .object({ value: z.number().finite(), unit: z.string().min(1).max(20), instrumentId: z.uuid().nullable() })
    .nullable(),
  prompts: z.int().min(0).max(99),
  remark: z.string().trim().max(500),
});
export type MarkCriterionInput = z.infer<typeof markCriterionSchema>;

export const stopForSafetySchema = z.object({ reason: z.string().trim().min(1, "Say in a few words what made you stop.").max(500) });

export const signObservationSchema = z.object({
  password: z.string().min(1, "Signing asks for your password again.").max(1000),
  /** Null where the outcome is "not yet". */
  level: z.int().min(1).max(5).nullable(),
  feedback: z.string().trim().max(1000),
});
export type SignObservationInput = z.infer<typeof signObservationSchema>;

export const withdrawSignOffSchema = z.object({
  password: z.string().min(1, "Withdrawing asks for your password again.").max(1000),
  reason: z.string().trim().min(1, "Give the reason: it stands in the record.").max(500),
});
export type WithdrawSignOffInput = z.infer<typeof withdrawSignOffSchema>;

/** The outcome as it stands with what is filled in so far. */
export const sheetOutcomeSchema = z.object({
  outcome: z.enum(["met", "not_yet"]),
  reasons: z.array(z.object({ key: z.string(), text: z.string() })),
  missing: z.array(z.string()),
  levelCap: z.int().min(1).max(5),
  capReasons: z.array(z.string()),
});
export type SheetOutcome = z.infer<typeof sheetOutcomeSchema>;

/** What the program says of a reading once it is entered. */
export const judgedReadingSchema = z.object({ verdict: z.enum(["inside", "near", "outside"]), sentence: z.string(), canBeMet: z.boolean() });
