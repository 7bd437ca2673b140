import type { Db } from "@/db/client";
import type { SignedDecision } from "@/lib/core/standing/standing-of";

/** One signed decision on a task, with what happened to it since. */
export type SignOffFact = SignedDecision & { apprenticeId: string; taskId: string; signOffId: string };

/** What else is known of a person and a task. */
export type ProgressFact = {
  apprenticeId: string;
  taskId: string;
  /** A module of the person's workshop or college of today opens the task. */
  hasModule: boolean;
  knowledgeMet: boolean;
  practiceRuns: number;
  evidencePhotos: number;
  readySince: Date | null;
  bookedFor: Date | null;
};

type Scope = { apprenticeIds: string[]; taskIds: string[] };

/** Every sign-off of these people on these tasks, oldest first: one query, whatever the numbers. */
export async function listSignOffFacts(db: Db, scope: Scope): Promise<SignOffFact[]> {
  const { rows } = await db.raw(
    `SELECT s.apprentice_id, s.task_id, s.id, s.outcome, s.level, s.signed_at::date AS signed_on, s.current_until,
       EXISTS (SELECT 1 FROM sign_off_changes c WHERE c.sign_off_id = s.id AND c.kind = 'withdrawal') AS withdrawn,
       EXISTS (
         SELECT 1 FROM task_revisions later JOIN task_revisions seen ON seen.id = s.task_revision_id
         WHERE later.task_id = s.task_id AND later.number > seen.number AND later.work_changed)
       OR EXISTS (
         SELECT 1 FROM module_revisions m JOIN module_revision_tasks t ON t.module_revision_id = m.id
         WHERE t.task_id = s.task_id AND m.work_changed AND m.published_at > s.signed_at) AS work_changed_since
     FROM sign_offs s
     WHERE s.apprentice_id = ANY(?) AND s.task_id = ANY(?)
     ORDER BY s.signed_at, s.id`,
    [scope.apprenticeIds, scope.taskIds],
  );
  return rows.map((row: Record<string, never>) => ({
    apprenticeId: row.apprentice_id,
    taskId: row.task_id,
    signOffId: row.id,
    outcome: row.outcome,
    level: row.level,
    signedOn: row.signed_on,
    currentUntil: row.current_until,
    withdrawn: row.withdrawn,
    workChangedSince: row.work_changed_since,
  }));
}

/** Knowledge, practice and readiness for every pair of these people and tasks: one query, one row a pair. */
export async function listProgressFacts(db: Db, scope: Scope): Promise<ProgressFact[]> {
  const { rows } = await db.raw(
    `WITH pair AS (
       SELECT apprentice_id, task_id FROM unnest(:apprenticeIds::uuid[]) AS apprentice_id CROSS JOIN unnest(:taskIds::uuid[]) AS task_id),
     opens AS (
       SELECT DISTINCT a.apprentice_id, t.task_id FROM module_revision_tasks t
       JOIN module_revisions m ON m.id = t.module_revision_id
       JOIN training_agreements a ON m.organisation_id IN (a.workshop_id, a.college_id)
       WHERE a.apprentice_id = ANY(:apprenticeIds) AND t.task_id = ANY(:taskIds)
         AND daterange(a.starts_on, a.ends_on, '[]') @> current_date),
     known AS (
       SELECT DISTINCT a.apprentice_id, t.task_id FROM assignments a
       JOIN module_revision_tasks t ON t.module_revision_id = a.module_revision_id
       WHERE a.apprentice_id = ANY(:apprenticeIds) AND t.task_id = ANY(:taskIds) AND a.knowledge_met_at IS NOT NULL),
     runs AS (
       SELECT apprentice_id, task_id, count(*) AS n FROM practice_runs
       WHERE apprentice_id = ANY(:apprenticeIds) AND task_id = ANY(:taskIds) GROUP BY 1, 2),
     photos AS (
       SELECT apprentice_id, task_id, count(*) AS n FROM evidence
       WHERE apprentice_id = ANY(:apprenticeIds) AND task_id = ANY(:taskIds) AND removed_at IS NULL GROUP BY 1, 2)
     SELECT pair.apprentice_id, pair.task_id, opens.task_id IS NOT NULL AS has_module, known.task_id IS NOT NULL AS knowledge_met,
       coalesce(runs.n, 0) AS practice_runs, coalesce(photos.n, 0) AS evidence_photos, r.declared_at, r.booked_for
     FROM pair
     LEFT JOIN opens USING (apprentice_id, task_id)
     LEFT JOIN known USING (apprentice_id, task_id)
     LEFT JOIN runs USING (apprentice_id, task_id)
     LEFT JOIN photos USING (apprentice_id, task_id)
     LEFT JOIN readiness r ON r.apprentice_id = pair.apprentice_id AND r.task_id = pair.task_id AND r.ended_at IS NULL`,
    scope,
  );
  return rows.map((row: Record<string, never>) => ({
    apprenticeId: row.apprentice_id,
    taskId: row.task_id,
    hasModule: row.has_module,
    knowledgeMet: row.knowledge_met,
    practiceRuns: row.practice_runs,
    evidencePhotos: row.evidence_photos,
    readySince: row.declared_at,
    bookedFor: row.booked_for,
  }));
}
