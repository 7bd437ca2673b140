import type { Db } from "@/db/client";

export type OpenSheet = { observationId: string; apprentice: string; task: string; vehicle: string; startedAt: Date; filled: number; criteria: number };

/** Sheets that an assessor has open, newest first. */
export async function listOpenSheets(db: Db, organisationId: string, assessorId: string): Promise<OpenSheet[]> {
  const { rows } = await db.raw(
    `SELECT o.id, p.name, r.content ->> 'title' AS task, o.vehicle, o.started_at, jsonb_array_length(r.content -> 'criteria') AS criteria,
       (SELECT count(*) FROM observation_marks m WHERE m.observation_id = o.id AND m.mark IS NOT NULL) AS filled
     FROM observations o JOIN people p ON p.id = o.apprentice_id JOIN task_revisions r ON r.id = o.task_revision_id
     WHERE o.organisation_id = ? AND o.assessor_id = ? AND o.state = 'open' ORDER BY o.started_at DESC`,
    [organisationId, assessorId],
  );
  return rows.map((row: Record<string, never>) => ({
    observationId: row.id,
    apprentice: row.name,
    task: row.task,
    vehicle: row.vehicle,
    startedAt: row.started_at,
    filled: row.filled,
    criteria: row.criteria,
  }));
}
