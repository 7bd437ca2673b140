import { getDb } from "@/db/client";
import { findRecordingForUpdate, resetFailedStages } from "@/db/queries/recordings";
import { AppError } from "@/lib/core/errors";
import type { Actor } from "@/lib/core/roles";
import { enqueue } from "@/lib/jobs/enqueue";
import { workOn } from "@/lib/services/recordings/work-on";

/**
 * Has the worker try again from the stage that failed; what was done is kept.
 * @throws AppError("forbidden" | "not_found"; "conflict" unless it failed)
 */
export async function prepareAgain(actor: Actor, recordingId: string): Promise<{ started: true }> {
  await getDb().transaction(async (trx) => {
    const recording = workOn(actor, await findRecordingForUpdate(trx, actor.organisation.id, recordingId));
    if (recording.state === "processing") throw new AppError("conflict", "This recording is being prepared already.");
    if (recording.state === "ready") throw new AppError("conflict", "This recording is ready; there is nothing to try again.");
    await resetFailedStages(trx, recording.id);
    await enqueue(trx, "process-recording", { recordingId: recording.id });
  });
  return { started: true };
}
