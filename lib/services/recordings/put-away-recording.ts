import { getDb } from "@/db/client";
import { findRecordingForUpdate, isInModules, setHidden } from "@/db/queries/recordings";
import { AppError } from "@/lib/core/errors";
import type { Actor } from "@/lib/core/roles";
import { workOn } from "@/lib/services/recordings/work-on";

/**
 * Puts a recording out of sight. Its film stays in the store, so that nothing is lost by a slip.
 * @throws AppError("forbidden" | "not_found"; "conflict" while a module is made of it)
 */
export async function putAwayRecording(actor: Actor, recordingId: string): Promise<{ putAway: true }> {
  await getDb().transaction(async (trx) => {
    const recording = workOn(actor, await findRecordingForUpdate(trx, actor.organisation.id, recordingId));
    if (await isInModules(trx, recording.id)) throw new AppError("conflict", "A module is made of this recording, so it stays.");
    await setHidden(trx, recording.id);
  });
  return { putAway: true };
}
