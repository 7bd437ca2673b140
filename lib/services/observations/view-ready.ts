import { getDb } from "@/db/client";
import { listUsableTaskRevisions } from "@/db/queries/tasks";
import { listReady } from "@/db/reads/ready-list";
import { daysBetween } from "@/lib/core/dates";
import { AppError } from "@/lib/core/errors";
import type { Actor } from "@/lib/core/roles";
import type { Standing } from "@/lib/core/standing/types";
import { canObserve } from "@/lib/policies/observations";
import { today } from "@/lib/services/clock";
import { listStandings } from "@/lib/services/standing/list-standings";

export type ReadyItem = {
  readinessId: string;
  apprenticeId: string;
  apprentice: string;
  workshop: string;
  taskId: string;
  task: string;
  standing: Standing;
  waitedDays: number;
  bookedFor: string | null;
  bookedBy: string | null;
  /** Why this assessor can't observe it, or null. */
  refused: string | null;
};

/** Who is ready to be observed, longest waiting first, and whether this assessor may. @throws AppError("forbidden") */
export async function viewReady(actor: Actor): Promise<ReadyItem[]> {
  if (!actor.roles.has("assessor")) throw new AppError("forbidden", "This page is an assessor’s.");
  const db = getDb();
  const tasks = new Map((await listUsableTaskRevisions(db, actor.organisation.id)).map((task) => [task.taskId, task.content]));
  const rows = (await listReady(db, actor.organisation.id)).filter((row) => tasks.has(row.taskId));
  const standings = await listStandings(db, [...new Set(rows.map((row) => row.apprenticeId))], [...new Set(rows.map((row) => row.taskId))]);
  const day = today();
  return rows.flatMap((row) => {
    const content = tasks.get(row.taskId);
    if (!content) return [];
    const may = canObserve(actor, { ...row, sharesRecord: true, independence: content.rule.independence });
    return [
      {
        readinessId: row.readinessId,
        apprenticeId: row.apprenticeId,
        apprentice: row.apprentice,
        workshop: row.workshop,
        taskId: row.taskId,
        task: content.title,
        standing: standings.of(row.apprenticeId, row.taskId).standing,
        waitedDays: daysBetween(row.declaredAt.toISOString().slice(0, 10), day),
        bookedFor: row.bookedFor?.toISOString() ?? null,
        bookedBy: row.bookedBy,
        refused: may.allowed ? null : may.reason,
      },
    ];
  });
}
