import { getDb } from "@/db/client";
import { findTrainee } from "@/db/queries/agreements";
import { findOpenSheet, findSheetByKey, insertSheet } from "@/db/queries/observations";
import { findUsableTaskRevision } from "@/db/queries/tasks";
import { assertAllowed } from "@/lib/core/decision";
import { AppError } from "@/lib/core/errors";
import type { Actor } from "@/lib/core/roles";
import { canObserve } from "@/lib/policies/observations";
import type { StartObservationInput } from "@/lib/schemas/observations";
import { standingOn } from "@/lib/services/standing/standing-on";

/**
 * Opens the sheet on the task's newest revision. The same press sent twice, or a sheet of one's own that is still open, gives that sheet.
 * @throws AppError("forbidden" | "not_found" | "conflict" when the task is not open for this apprentice)
 */
export async function startObservation(actor: Actor, input: StartObservationInput): Promise<{ observationId: string }> {
  const organisationId = actor.organisation.id;
  return getDb().transaction(async (trx) => {
    const revision = await findUsableTaskRevision(trx, organisationId, input.taskId);
    if (!revision) throw new AppError("not_found", "There is no such task.");
    const trainee = await findTrainee(trx, organisationId, input.apprenticeId);
    assertAllowed(
      canObserve(actor, {
        apprenticeId: input.apprenticeId,
        sharesRecord: trainee !== undefined,
        independence: revision.content.rule.independence,
        workshopId: trainee?.workshopId ?? "",
      }),
    );
    if (!trainee) throw new AppError("not_found", "There is no such apprentice.");
    const standing = await standingOn(trx, input.apprenticeId, input.taskId);
    if (standing.next === "not_open") {
      throw new AppError("conflict", `The task is not open for ${trainee.name} yet: the module's rule comes first.`);
    }

    const mine = { organisationId, apprenticeId: input.apprenticeId, taskId: input.taskId, assessorId: actor.personId };
    const made = await insertSheet(trx, {
      ...mine,
      workshopId: trainee.workshopId,
      taskRevisionId: revision.id,
      vehicle: input.vehicle,
      jobCardNumber: input.jobCardNumber,
      idempotencyKey: input.idempotencyKey,
    });
    if (made) return { observationId: made };
    const open = await findOpenSheet(trx, mine);
    if (open) return { observationId: open };
    const earlier = await findSheetByKey(trx, input.idempotencyKey);
    if (earlier?.assessorId === actor.personId) return { observationId: earlier.id };
    throw new AppError("conflict", "This press was taken already. Load the page again.");
  });
}
