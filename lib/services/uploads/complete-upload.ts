import type { Knex } from "knex";
import { getDb } from "@/db/client";
import { insertFile } from "@/db/queries/files";
import { insertRecording, insertStages } from "@/db/queries/recordings";
import { endUpload, findUpload, findUploadForUpdate, type Upload } from "@/db/queries/uploads";
import { AppError } from "@/lib/core/errors";
import { titleFromFileName } from "@/lib/core/recordings/title-from-file-name";
import type { Actor } from "@/lib/core/roles";
import { enqueue } from "@/lib/jobs/enqueue";
import type { CompletedUpload } from "@/lib/schemas/uploads";
import { myUpload } from "@/lib/services/uploads/my-upload";
import { getStore } from "@/storage/store";

/**
 * Puts an upload's parts together and keeps what comes of it: a recording that the worker prepares, or a file for evidence. The parts are
 * those that the store names, and their sum must be the size that was said. Asked twice, also at once, it gives the same answer.
 * @throws AppError("not_found"; "conflict" while parts are missing; "gone" after it was given up; "unavailable")
 */
export async function completeUpload(actor: Actor, uploadId: string): Promise<CompletedUpload> {
  const organisationId = actor.organisation.id;
  const upload = myUpload(actor, await findUpload(getDb(), organisationId, uploadId));
  if (upload.state === "completed") return outcomeOf(upload);
  assertNotGivenUp(upload);
  const { sizeBytes } = await getStore().completeMultipart(upload.storeKey, upload.storeUploadId, upload.sizeBytes);
  if (sizeBytes !== upload.sizeBytes) throw new AppError("conflict", `${sizeBytes} of ${upload.sizeBytes} bytes of the file have arrived.`);

  return getDb().transaction(async (trx) => {
    const locked = myUpload(actor, await findUploadForUpdate(trx, organisationId, uploadId));
    assertNotGivenUp(locked);
    if (locked.state === "open") await keep(trx, locked);
    return outcomeOf(locked);
  });
}

/** One id from upload to recording: of two completions only one can ever write it. */
async function keep(trx: Knex.Transaction, upload: Upload): Promise<void> {
  await endUpload(trx, upload.id, "completed");
  const fileId = await insertFile(trx, { ...upload, createdBy: upload.personId });
  if (upload.purpose !== "recording") return;
  const title = titleFromFileName(upload.fileName, upload.modifiedMs);
  await insertRecording(trx, { id: upload.id, organisationId: upload.organisationId, title, recordedBy: upload.personId, sourceFileId: fileId });
  await insertStages(trx, upload.id);
  await enqueue(trx, "process-recording", { recordingId: upload.id });
}

const outcomeOf = ({ id, purpose }: Upload): CompletedUpload => ({ fileId: id, recordingId: purpose === "recording" ? id : null });

function assertNotGivenUp({ state }: Upload): void {
  if (state === "aborted") throw new AppError("gone", "This upload was given up. Start it again.");
}
