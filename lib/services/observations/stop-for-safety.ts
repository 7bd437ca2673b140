import { getDb } from "@/db/client";
import { findSheetForUpdate, setStopped } from "@/db/queries/observations";
import type { Actor } from "@/lib/core/roles";
import { openSheet } from "@/lib/services/observations/mark-criterion";

/**
 * Notes that the assessor stopped the work for safety. The sheet stays open for signing and can only end as not yet.
 * @throws AppError("not_found" | "forbidden" | "conflict")
 */
export async function stopForSafety(actor: Actor, observationId: string, reason: string): Promise<{ stopped: true }> {
  return getDb().transaction(async (trx) => {
    const sheet = openSheet(await findSheetForUpdate(trx, actor.organisation.id, observationId), actor);
    await setStopped(trx, sheet.id, reason);
    return { stopped: true };
  });
}
