import type { Db } from "@/db/client";
import type { TaskContent } from "@/lib/core/tasks/types";

/**
 * Tasks that an organisation may use: its own, and those of every organisation that it shares a training agreement with today.
 * (A college's tasks are used by the workshops of its apprentices, and the other way round.)
 */
export const usableTasks = (db: Db, organisationId: string) =>
  db("tasks as t")
    .whereNull("t.retired_at")
    .where((either) =>
      either.where("t.organisation_id", organisationId).orWhereIn(
        "t.organisation_id",
        db("training_agreements as a")
          .select(db.raw("CASE WHEN a.workshop_id = ? THEN a.college_id ELSE a.workshop_id END", [organisationId]))
          .where((side) => side.where("a.workshop_id", organisationId).orWhere("a.college_id", organisationId))
          .whereRaw("daterange(a.starts_on, a.ends_on, '[]') @> current_date"),
      ),
    );

/** How many of `taskIds` the organisation may use. */
export async function countUsableTasks(db: Db, organisationId: string, taskIds: string[]): Promise<number> {
  const row = await usableTasks(db, organisationId).whereIn("t.id", taskIds).count("t.id as n").first();
  return Number((row as { n: number } | undefined)?.n ?? 0);
}

export type TaskRevision = { id: string; taskId: string; organisationId: string; number: number; content: TaskContent; contentHash: string };

type RevisionRow = { id: string; task_id: string; organisation_id: string; number: number; content: TaskContent; content_hash: string };
const toRevision = (row: RevisionRow): TaskRevision => ({
  id: row.id,
  taskId: row.task_id,
  organisationId: row.organisation_id,
  number: row.number,
  content: row.content,
  contentHash: row.content_hash,
});
const newestRevisions = (db: Db) =>
  db("task_revisions as r")
    .distinctOn("r.task_id")
    .select<RevisionRow[]>("r.id", "r.task_id", "r.organisation_id", "r.number", "r.content", "r.content_hash")
    .orderBy([{ column: "r.task_id" }, { column: "r.number", order: "desc" }]);

/** The newest revision of each task that the organisation may use and that was published. */
export async function listUsableTaskRevisions(db: Db, organisationId: string): Promise<TaskRevision[]> {
  const rows = await newestRevisions(db).whereIn("r.task_id", usableTasks(db, organisationId).select("t.id"));
  return rows.map(toRevision);
}

/** The newest revision of one task that the organisation may use. */
export async function findUsableTaskRevision(db: Db, organisationId: string, taskId: string): Promise<TaskRevision | undefined> {
  const [row] = await newestRevisions(db).where("r.task_id", taskId).whereIn("r.task_id", usableTasks(db, organisationId).select("t.id"));
  return row && toRevision(row);
}
