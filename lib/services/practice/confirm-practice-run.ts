import { getDb } from "@/db/client";
import { findPracticeRunForUpdate, setRunConfirmed } from "@/db/queries/practice";
import { assertAllowed } from "@/lib/core/decision";
import { AppError } from "@/lib/core/errors";
import type { Actor } from "@/lib/core/roles";
import { canConfirmRun } from "@/lib/policies/practice";

/**
 * Confirms a run as witness. Said twice, the first stands.
 * @throws AppError("not_found" | "forbidden")
 */
export async function confirmPracticeRun(actor: Actor, practiceRunId: string): Promise<{ confirmed: true }> {
  return getDb().transaction(async (trx) => {
    const run = await findPracticeRunForUpdate(trx, actor.organisation.id, practiceRunId);
    if (!run) throw new AppError("not_found", "There is no such practice run.");
    assertAllowed(canConfirmRun(actor, run));
    if (!run.confirmedAt) await setRunConfirmed(trx, run.id, actor.personId);
    return { confirmed: true };
  });
}
