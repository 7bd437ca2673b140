import { getDb } from "@/db/client";
import { findUpload } from "@/db/queries/uploads";
import { AppError } from "@/lib/core/errors";
import type { Actor } from "@/lib/core/roles";
import { partCount, partRange } from "@/lib/core/uploads/part-plan";
import { myUpload } from "@/lib/services/uploads/my-upload";
import { getStore } from "@/storage/store";

const VALID_SECONDS = 3600;

/**
 * Addresses to which the browser may send these parts of an open upload of its own. Each takes exactly as many bytes as that part has.
 * @throws AppError("not_found" | "gone" | "invalid_input" for a number that the file has no part for)
 */
export async function signParts(actor: Actor, uploadId: string, partNumbers: number[]): Promise<{ parts: { partNumber: number; url: string }[] }> {
  const upload = myUpload(actor, await findUpload(getDb(), actor.organisation.id, uploadId));
  if (upload.state !== "open") throw new AppError("gone", "This upload is no longer open. Start it again.");
  const count = partCount(upload.sizeBytes, upload.partSizeBytes);
  const beyond = partNumbers.find((number) => number > count);
  if (beyond !== undefined) throw new AppError("invalid_input", `The file has ${count} parts; there is no part ${beyond}.`);
  const parts = await Promise.all(
    [...new Set(partNumbers)].map(async (partNumber) => {
      const { start, end } = partRange(partNumber, upload.sizeBytes, upload.partSizeBytes);
      const url = await getStore().presignPart(upload.storeKey, upload.storeUploadId, partNumber, VALID_SECONDS, end - start);
      return { partNumber, url };
    }),
  );
  return { parts };
}
