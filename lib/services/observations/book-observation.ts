import { getDb } from "@/db/client";
import { findTrainee } from "@/db/queries/agreements";
import { findOpenReadinessForUpdate, setBooking } from "@/db/queries/practice";
import { findUsableTaskRevision } from "@/db/queries/tasks";
import { assertAllowed } from "@/lib/core/decision";
import { AppError } from "@/lib/core/errors";
import type { Actor } from "@/lib/core/roles";
import { canObserve } from "@/lib/policies/observations";

/**
 * Books when an apprentice who is ready will be observed.
 * @throws AppError("not_found" | "forbidden" | "invalid_input" for a time that has passed)
 */
export async function bookObservation(actor: Actor, readinessId: string, startsAt: string): Promise<{ booked: true }> {
  if (new Date(startsAt).getTime() < Date.now()) throw new AppError("invalid_input", "That time has passed.");
  return getDb().transaction(async (trx) => {
    const ready = await findOpenReadinessForUpdate(trx, readinessId);
    const revision = ready && (await findUsableTaskRevision(trx, actor.organisation.id, ready.taskId));
    const trainee = ready && (await findTrainee(trx, actor.organisation.id, ready.apprenticeId));
    // Somebody else's apprentice looks like nobody's.
    if (!ready || !revision || !trainee) throw new AppError("not_found", "Nobody is waiting here any more.");
    const { independence } = revision.content.rule;
    assertAllowed(canObserve(actor, { apprenticeId: ready.apprenticeId, sharesRecord: true, independence, workshopId: trainee.workshopId }));
    await setBooking(trx, ready.id, { startsAt, bookedBy: actor.personId });
    return { booked: true };
  });
}
