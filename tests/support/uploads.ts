import { randomBytes } from "node:crypto";
import type { Actor } from "@/lib/core/roles";
import { partCount, partRange } from "@/lib/core/uploads/part-plan";
import type { CompletedUpload, StartUploadInput, UploadView } from "@/lib/schemas/uploads";
import { completeUpload } from "@/lib/services/uploads/complete-upload";
import { signParts } from "@/lib/services/uploads/sign-parts";
import { startUpload } from "@/lib/services/uploads/start-upload";

/** A picked file as a browser tells of it; a new one each time. */
export const someFile = (sizeBytes: number, over: Partial<StartUploadInput> = {}): StartUploadInput => ({
  purpose: "recording",
  fileName: `front brakes ${randomBytes(3).toString("hex")}.mp4`,
  mediaType: "video/mp4",
  sizeBytes,
  modifiedMs: 1_764_579_600_000,
  ...over,
});

/** Sends these parts of a file to the store as a browser does. Returns the store's answers. */
export async function sendParts(actor: Actor, upload: UploadView, bytes: Buffer, numbers?: number[]): Promise<number[]> {
  const all = Array.from({ length: partCount(bytes.length, upload.partSizeBytes) }, (_, index) => index + 1);
  const { parts } = await signParts(actor, upload.uploadId, numbers ?? all);
  return Promise.all(
    parts.map(async ({ partNumber, url }) => {
      const { start, end } = partRange(partNumber, bytes.length, upload.partSizeBytes);
      return (await fetch(url, { method: "PUT", body: new Uint8Array(bytes.subarray(start, end)) })).status;
    }),
  );
}

/** Brings bytes in from beginning to end. */
export async function bringIn(actor: Actor, bytes: Buffer, over: Partial<StartUploadInput> = {}): Promise<CompletedUpload> {
  const upload = await startUpload(actor, someFile(bytes.length, over));
  await sendParts(actor, upload, bytes);
  return completeUpload(actor, upload.uploadId);
}
