import { getDb } from "@/db/client";
import {
  endUpload, findOpenUploadOf, findUploadForUpdate, insertUpload, listOpenUploads, lockUploadsOf, newUploadId, type Upload,
} from "@/db/queries/uploads";
import { assertAllowed } from "@/lib/core/decision";
import { AppError } from "@/lib/core/errors";
import type { Actor } from "@/lib/core/roles";
import { partSizeBytes } from "@/lib/core/uploads/part-plan";
import { env } from "@/lib/env";
import { canStartUpload } from "@/lib/policies/recordings";
import type { StartUploadInput, UploadView } from "@/lib/schemas/uploads";
import { describeUpload } from "@/lib/services/uploads/describe-upload";
import { evidenceKey, sourceKey } from "@/storage/keys";
import { getStore } from "@/storage/store";

const EVIDENCE_LIMIT_BYTES = 40 * 1024 * 1024;
const MOST_OPEN = 20;

/**
 * Starts an upload, or finds the one that the same person began with the same file (name, size, date), so that picking it again goes on.
 * The upload's id becomes the id of the recording or file that comes of it, and is all that its key in the store is made of.
 * @throws AppError("forbidden" | "too_large" | "too_many" | "unavailable")
 */
export async function startUpload(actor: Actor, input: StartUploadInput): Promise<UploadView> {
  assertAllowed(canStartUpload(actor, input.purpose));
  assertNotTooLarge(input);
  const db = getDb();
  const organisationId = actor.organisation.id;
  const mark = { organisationId, personId: actor.personId, ...input };
  const begun = await findOpenUploadOf(db, mark);
  const known = begun && (await describeOrEnd(begun));
  if (known) return known;

  const id = await newUploadId(db);
  const storeKey =
    input.purpose === "recording" ? sourceKey({ organisationId, recordingId: id }) : evidenceKey({ organisationId, evidenceId: id });
  const { uploadId: storeUploadId } = await getStore().startMultipart(storeKey, { contentType: input.mediaType });
  const abandon = () => getStore().abortMultipart(storeKey, storeUploadId);
  const { upload, isOurs } = await db
    .transaction(async (trx) => {
      await lockUploadsOf(trx, actor.personId);
      const other = await findOpenUploadOf(trx, mark);
      if (other) return { upload: other, isOurs: false };
      const open = await listOpenUploads(trx, { organisationId, personId: actor.personId });
      if (open.length >= MOST_OPEN) {
        throw new AppError("too_many", `You have ${open.length} files that did not arrive whole. Finish or give up some of them first.`);
      }
      const made = await insertUpload(trx, { id, ...mark, storeKey, storeUploadId, partSizeBytes: partSizeBytes(input.sizeBytes) });
      return { upload: made, isOurs: true };
    })
    .catch(async (error: unknown) => {
      await abandon().catch(() => {}); // The first error is the one to tell.
      throw error;
    });
  if (!isOurs) await abandon();
  return describeUpload(upload);
}

function assertNotTooLarge({ purpose, sizeBytes }: StartUploadInput): void {
  const limit = purpose === "recording" ? env().UPLOAD_LIMIT_BYTES : Math.min(EVIDENCE_LIMIT_BYTES, env().UPLOAD_LIMIT_BYTES);
  if (sizeBytes <= limit) return;
  const [size, most] = [sizeBytes, limit].map((bytes) => (bytes >= 1e9 ? `${(bytes / 1e9).toFixed(1)} GB` : `${Math.ceil(bytes / 1e6)} MB`));
  throw new AppError("too_large", `The file has ${size}; at most ${most} can be taken.`);
}

/** The upload as it is, or undefined after ending it if the store has dropped its parts: it is begun anew then. */
async function describeOrEnd(upload: Upload): Promise<UploadView | undefined> {
  try {
    return await describeUpload(upload);
  } catch (error) {
    if (!(error instanceof AppError && error.code === "gone")) throw error;
    await getDb().transaction(async (trx) => {
      const locked = await findUploadForUpdate(trx, upload.organisationId, upload.id);
      if (locked?.state === "open") await endUpload(trx, upload.id, "aborted");
    });
    return undefined;
  }
}
