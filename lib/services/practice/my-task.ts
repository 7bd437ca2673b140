import type { Db } from "@/db/client";
import { findTrainee } from "@/db/queries/agreements";
import { findUsableTaskRevision, type TaskRevision } from "@/db/queries/tasks";
import { assertAllowed } from "@/lib/core/decision";
import { AppError } from "@/lib/core/errors";
import type { Actor } from "@/lib/core/roles";
import { canPractise } from "@/lib/policies/practice";

/**
 * The task, for an apprentice who trains here today.
 * @throws AppError("not_found" | "forbidden")
 */
export async function myTask(db: Db, actor: Actor, taskId: string): Promise<TaskRevision> {
  const trainee = await findTrainee(db, actor.organisation.id, actor.personId);
  assertAllowed(canPractise(actor, { trainsHereToday: trainee !== undefined && trainee.workshopId === actor.organisation.id }));
  const revision = await findUsableTaskRevision(db, actor.organisation.id, taskId);
  if (!revision) throw new AppError("not_found", "There is no such task.");
  return revision;
}
