import { getDb } from "@/db/client";
import { endUpload, findUploadForUpdate } from "@/db/queries/uploads";
import { AppError } from "@/lib/core/errors";
import type { Actor } from "@/lib/core/roles";
import { myUpload } from "@/lib/services/uploads/my-upload";
import { getStore } from "@/storage/store";

/**
 * Gives up an upload and throws away what has arrived of it. Asked twice, nothing more happens.
 * @throws AppError("not_found"; "conflict" if it has already become a recording or file; "unavailable")
 */
export async function cancelUpload(actor: Actor, uploadId: string): Promise<{ cancelled: true }> {
  const upload = await getDb().transaction(async (trx) => {
    const locked = myUpload(actor, await findUploadForUpdate(trx, actor.organisation.id, uploadId));
    if (locked.state === "completed") throw new AppError("conflict", "This file has arrived whole and was added already.");
    if (locked.state === "open") await endUpload(trx, locked.id, "aborted");
    return locked;
  });
  await getStore().abortMultipart(upload.storeKey, upload.storeUploadId);
  // A completion that came at the same moment may have made the object; nothing stands for it.
  await getStore().deleteObject(upload.storeKey);
  return { cancelled: true };
}
