import { getDb } from "@/db/client";
import { insertPracticeRun } from "@/db/queries/practice";
import { AppError } from "@/lib/core/errors";
import type { Actor } from "@/lib/core/roles";
import type { PracticeRunInput } from "@/lib/schemas/tasks";
import { today } from "@/lib/services/clock";
import { myTask } from "@/lib/services/practice/my-task";
import { standingOn } from "@/lib/services/standing/standing-on";

/**
 * Logs a practice run of one's own on a task that is open.
 * @throws AppError("not_found" | "forbidden" | "conflict" while the task is not open | "invalid_input" for a day to come)
 */
export async function logPracticeRun(actor: Actor, taskId: string, input: PracticeRunInput): Promise<{ practiceRunId: string }> {
  if (input.doneOn > today()) throw new AppError("invalid_input", "That day is still to come.");
  return getDb().transaction(async (trx) => {
    await myTask(trx, actor, taskId);
    const standing = await standingOn(trx, actor.personId, taskId);
    if (standing.next === "not_open") throw new AppError("conflict", "This task isn’t open yet: learn its module first.");
    const id = await insertPracticeRun(trx, { ...input, organisationId: actor.organisation.id, apprenticeId: actor.personId, taskId });
    if (!id) throw new AppError("conflict", "This press was taken already. Load the page again.");
    return { practiceRunId: id };
  });
}
