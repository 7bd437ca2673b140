import { z } from "zod";

export const practiceRunSchema = z.object({
  doneOn: z.iso.date("Give the day."),
  vehicle: z.string().trim().min(1, "Name the vehicle.").max(120),
  jobCardNumber: z.string().trim().max(40),
  minutes: z.int().min(1, "At least a minute.").max(1440, "A day has 1,440 minutes."),
  note: z.string().trim().max(1000),
  /** Made by the device once per press, so that a press sent twice is one run. */
  idempotencyKey: z.uuid(),
});
export type PracticeRunInput = z.infer<typeof practiceRunSchema>;

export const evidenceSchema = z.object({ fileId: z.uuid(), note: z.string().trim().max(500) });
export type EvidenceInput = z.infer<typeof evidenceSchema>;

export const bookingSchema = z.object({ startsAt: z.iso.datetime({ offset: true, message: "Give day and time." }) });
