import { getDb } from "@/db/client";
import { openReadiness, takeReadinessBack } from "@/db/queries/practice";
import { AppError } from "@/lib/core/errors";
import type { Actor } from "@/lib/core/roles";
import { readyProblems } from "@/lib/core/tasks/ready-problems";
import { listStandings } from "@/lib/services/standing/list-standings";
import { myTask } from "@/lib/services/practice/my-task";

/**
 * Says "I am ready to be seen", once knowledge, practice and evidence are there.
 * @throws AppError("not_found" | "forbidden" | "conflict" with what is missing)
 */
export async function declareReady(actor: Actor, taskId: string): Promise<{ ready: true }> {
  return getDb().transaction(async (trx) => {
    const { content } = await myTask(trx, actor, taskId);
    const { progress } = (await listStandings(trx, [actor.personId], [taskId])).of(actor.personId, taskId);
    const problems = readyProblems(content.rule, progress);
    if (problems.length > 0) throw new AppError("conflict", `Not ready yet. ${problems.join(" ")}`);
    await openReadiness(trx, { organisationId: actor.organisation.id, apprenticeId: actor.personId, taskId });
    return { ready: true };
  });
}

/** Takes it back. @throws AppError("not_found" | "forbidden") */
export async function takeReadyBack(actor: Actor, taskId: string): Promise<{ ready: false }> {
  return getDb().transaction(async (trx) => {
    await myTask(trx, actor, taskId);
    await takeReadinessBack(trx, { apprenticeId: actor.personId, taskId });
    return { ready: false };
  });
}
