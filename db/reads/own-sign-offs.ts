import type { Db } from "@/db/client";
import type { Level, Outcome } from "@/lib/core/tasks/types";

export type OwnSignOff = { signOffId: string; task: string; signedAt: Date; outcome: Outcome; level: Level | null; assessor: string; withdrawn: boolean };

/** Every signed sheet about one person, newest first. */
export async function listOwnSignOffs(db: Db, personId: string): Promise<OwnSignOff[]> {
  const { rows } = await db.raw(
    `SELECT s.id, r.content ->> 'title' AS task, s.signed_at, s.outcome, s.level, a.name AS assessor,
       EXISTS (SELECT 1 FROM sign_off_changes c WHERE c.sign_off_id = s.id AND c.kind = 'withdrawal') AS withdrawn
     FROM sign_offs s JOIN task_revisions r ON r.id = s.task_revision_id JOIN people a ON a.id = s.assessor_id
     WHERE s.apprentice_id = ? ORDER BY s.signed_at DESC, s.id DESC`,
    [personId],
  );
  return rows.map((row: Record<string, never>) => ({
    signOffId: row.id,
    task: row.task,
    signedAt: row.signed_at,
    outcome: row.outcome,
    level: row.level,
    assessor: row.assessor,
    withdrawn: row.withdrawn,
  }));
}
