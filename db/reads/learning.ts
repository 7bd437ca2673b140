import type { Db } from "@/db/client";

export type GivenModule = {
  assignmentId: string;
  title: string;
  number: number;
  dueOn: string;
  knowledgeMetAt: Date | null;
  steps: number;
  lengthMs: number;
  questions: number;
  right: number;
};

/** What an apprentice was given at a workshop and still holds, what is due first on top. One query. */
export async function listGivenModules(db: Db, organisationId: string, apprenticeId: string): Promise<GivenModule[]> {
  const { rows } = await db.raw(
    `SELECT a.id, r.content ->> 'title' AS title, r.number, a.due_on, a.knowledge_met_at,
       jsonb_array_length(r.content -> 'steps') AS steps,
       (SELECT sum((s ->> 'endMs')::int - (s ->> 'startMs')::int) FROM jsonb_array_elements(r.content -> 'steps') s) AS length_ms,
       jsonb_array_length(r.content -> 'questions') AS questions,
       (SELECT count(*) FROM (
          SELECT DISTINCT ON (question_id) is_right FROM answers n WHERE n.assignment_id = a.id
          ORDER BY question_id, answered_at DESC) latest WHERE latest.is_right) AS correct
     FROM assignments a JOIN module_revisions r ON r.id = a.module_revision_id
     WHERE a.organisation_id = ? AND a.apprentice_id = ? AND a.withdrawn_at IS NULL
     ORDER BY (a.knowledge_met_at IS NOT NULL), a.due_on, title`,
    [organisationId, apprenticeId],
  );
  return rows.map((row: Record<string, never>) => ({
    assignmentId: row.id,
    title: row.title,
    number: row.number,
    dueOn: row.due_on,
    knowledgeMetAt: row.knowledge_met_at,
    steps: row.steps,
    lengthMs: row.length_ms,
    questions: row.questions,
    right: row.correct,
  }));
}

/** Titles of the newest revisions of tasks, by id. */
export async function listTaskTitles(db: Db, taskIds: string[]): Promise<{ id: string; title: string }[]> {
  const rows = await db("task_revisions")
    .distinctOn("task_id")
    .select("task_id", db.raw("content ->> 'title' AS title"))
    .whereIn("task_id", taskIds)
    .orderBy([{ column: "task_id" }, { column: "number", order: "desc" }]);
  return rows.map((row) => ({ id: row.task_id, title: row.title }));
}
