import { z } from "zod";

export const recordingStateSchema = z.enum(["processing", "ready", "failed"]);

export const recordingListItemSchema = z.object({
  recordingId: z.uuid(),
  title: z.string(),
  state: recordingStateSchema,
  failure: z.string().nullable(),
  /** How far the preparing is, over all stages. */
  percent: z.int(),
  durationMs: z.int().nullable(),
  vehicle: z.string().nullable(),
  steps: z.int(),
  recordedBy: z.string(),
  createdAt: z.iso.datetime(),
  poster: z.string().nullable(),
});
export type RecordingListItem = z.infer<typeof recordingListItemSchema>;

export const stageSchema = z.object({
  stage: z.enum(["probe", "480p", "720p", "poster", "storyboard"]),
  state: z.enum(["waiting", "running", "done", "failed"]),
  percent: z.int(),
  failure: z.string().nullable(),
});
export type StageView = z.infer<typeof stageSchema>;

export const recordingSchema = z.object({
  recordingId: z.uuid(),
  title: z.string(),
  state: recordingStateSchema,
  failure: z.string().nullable(),
  durationMs: z.int().nullable(),
  /** The source's own size, upright. */
  width: z.int().nullable(),
  height: z.int().nullable(),
  hasSound: z.boolean().nullable(),
  vehicleId: z.uuid().nullable(),
  consent: z.enum(["nobody_in_shot", "consent_given"]).nullable(),
  consentNote: z.string(),
  privateDetailsCheckedAt: z.iso.datetime().nullable(),
  privateDetailsCheckedBy: z.string().nullable(),
  recordedBy: z.string(),
  createdAt: z.iso.datetime(),
  fileName: z.string().nullable(),
  sizeBytes: z.int(),
  steps: z.int(),
  questions: z.int(),
  stages: z.array(stageSchema),
  modules: z.array(z.object({ moduleId: z.uuid(), title: z.string() })),
});
export type RecordingView = z.infer<typeof recordingSchema>;

/** What is left out stays as it is. A vehicle is one of the workshop's, or a new one by label and model. */
export const changeRecordingSchema = z.object({
  title: z.string().trim().min(1, "Give the recording a title.").max(200).optional(),
  vehicle: z
    .union([
      z.object({ vehicleId: z.uuid() }),
      z.object({
        label: z.string().trim().min(1, "Name the vehicle as the workshop does.").max(80),
        model: z.string().trim().min(1, "Give the model.").max(120),
      }),
    ])
    .nullable()
    .optional(),
  consent: z.enum(["nobody_in_shot", "consent_given"]).optional(),
  consentNote: z.string().trim().max(500).optional(),
  privateDetailsChecked: z.boolean().optional(),
});
export type ChangeRecordingInput = z.input<typeof changeRecordingSchema>;

export const captionsSchema = z.object({
  language: z.string().regex(/^[a-z]{2,3}(-[A-Za-z0-9]{2,8})*$/, "Give the language by its code, such as en or de.").default("en"),
  /** The file's text: WebVTT or SubRip. */
  text: z.string().min(1, "The file is empty.").max(2_000_000, "The file is larger than any film's captions."),
});
