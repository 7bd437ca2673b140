import { getDb } from "@/db/client";
import { removeEvidence as removeRow } from "@/db/queries/practice";
import { AppError } from "@/lib/core/errors";
import type { Actor } from "@/lib/core/roles";

/** Takes evidence of one's own away from view. @throws AppError("not_found") */
export async function removeEvidence(actor: Actor, evidenceId: string): Promise<{ removed: true }> {
  return getDb().transaction(async (trx) => {
    const removed = await removeRow(trx, { organisationId: actor.organisation.id, apprenticeId: actor.personId, evidenceId });
    if (!removed) throw new AppError("not_found", "There is no such photo of yours.");
    return { removed: true };
  });
}
