import { z } from "zod";

export const uploadPurposeSchema = z.enum(["recording", "evidence"]);

const UNKNOWN_TYPE = "application/octet-stream";

/** What a browser tells of a picked file. Nothing of it is trusted but as a mark to find the file again by. */
export const startUploadSchema = z.object({
  purpose: uploadPurposeSchema,
  fileName: z.string().trim().min(1, "The file has no name.").max(255, "The file’s name is longer than 255 characters. Give it a shorter one."),
  mediaType: z
    .string()
    .max(100)
    .transform((type) => (/^[\w.+-]+\/[\w.+-]+$/.test(type) ? type : UNKNOWN_TYPE)),
  sizeBytes: z.int().min(1, "The file is empty."),
  modifiedMs: z.int().min(0),
});
export type StartUploadInput = z.infer<typeof startUploadSchema>;

/** An upload as its own person sees it. `receivedParts` is what the store says has arrived. */
export const uploadSchema = z.object({
  uploadId: z.uuid(),
  purpose: uploadPurposeSchema,
  fileName: z.string(),
  sizeBytes: z.int(),
  modifiedMs: z.int(),
  partSizeBytes: z.int(),
  state: z.enum(["open", "completed", "aborted"]),
  receivedParts: z.array(z.int()),
  receivedBytes: z.int(),
});
export type UploadView = z.infer<typeof uploadSchema>;

export const partNumbersSchema = z.object({ partNumbers: z.array(z.int().min(1).max(10_000)).min(1).max(64) });

/** Where a completed upload went: a recording, or a file that evidence may be made of. */
export const completedUploadSchema = z.object({ fileId: z.uuid(), recordingId: z.uuid().nullable() });
export type CompletedUpload = z.infer<typeof completedUploadSchema>;
