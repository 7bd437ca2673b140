import type { Db } from "@/db/client";

export type RunToConfirm = { id: string; apprentice: string; apprenticeId: string; task: string; doneOn: string; vehicle: string; minutes: number; note: string };

/** Practice runs at a workshop that no mentor has confirmed yet, oldest first. */
export async function listRunsToConfirm(db: Db, organisationId: string): Promise<RunToConfirm[]> {
  const { rows } = await db.raw(
    `SELECT r.id, p.name, r.apprentice_id, t.title, r.done_on, r.vehicle, r.minutes, r.note
     FROM practice_runs r JOIN people p ON p.id = r.apprentice_id
     JOIN LATERAL (SELECT content ->> 'title' AS title FROM task_revisions WHERE task_id = r.task_id ORDER BY number DESC LIMIT 1) t ON true
     WHERE r.organisation_id = ? AND r.confirmed_at IS NULL
     ORDER BY r.done_on, r.id LIMIT 200`,
    [organisationId],
  );
  return rows.map((row: Record<string, never>) => ({
    id: row.id,
    apprentice: row.name,
    apprenticeId: row.apprentice_id,
    task: row.title,
    doneOn: row.done_on,
    vehicle: row.vehicle,
    minutes: row.minutes,
    note: row.note,
  }));
}
