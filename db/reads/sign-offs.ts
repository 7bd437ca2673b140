import type { Db } from "@/db/client";
import type { Level, Outcome, TaskContent } from "@/lib/core/tasks/types";

export type SignOffListItem = {
  signOffId: string;
  signedAt: Date;
  apprentice: string;
  apprenticeId: string;
  task: string;
  outcome: Outcome;
  level: Level | null;
  assessor: string;
  workshop: string;
  withdrawn: boolean;
};

const withdrawn = `EXISTS (SELECT 1 FROM sign_off_changes c WHERE c.sign_off_id = s.id AND c.kind = 'withdrawal') AS withdrawn`;

/**
 * Sign-offs that an organisation may read, newest first: those it signed, those made at its workshop, and those of apprentices whose
 * record it shares today. At most `limit`.
 */
export async function listSignOffs(db: Db, organisationId: string, limit: number): Promise<SignOffListItem[]> {
  const { rows } = await db.raw(
    `SELECT s.id, s.signed_at, p.name AS apprentice, s.apprentice_id, r.content ->> 'title' AS task, s.outcome, s.level,
       a.name AS assessor, w.name AS workshop, ${withdrawn}
     FROM sign_offs s
     JOIN people p ON p.id = s.apprentice_id
     JOIN people a ON a.id = s.assessor_id
     JOIN organisations w ON w.id = s.workshop_id
     JOIN task_revisions r ON r.id = s.task_revision_id
     WHERE s.organisation_id = :organisationId OR s.workshop_id = :organisationId OR s.apprentice_id IN (
       SELECT apprentice_id FROM training_agreements
       WHERE (workshop_id = :organisationId OR college_id = :organisationId) AND daterange(starts_on, ends_on, '[]') @> current_date)
     ORDER BY s.signed_at DESC, s.id DESC LIMIT :limit`,
    { organisationId, limit },
  );
  return rows.map((row: Record<string, never>) => ({
    signOffId: row.id,
    signedAt: row.signed_at,
    apprentice: row.apprentice,
    apprenticeId: row.apprentice_id,
    task: row.task,
    outcome: row.outcome,
    level: row.level,
    assessor: row.assessor,
    workshop: row.workshop,
    withdrawn: row.withdrawn,
  }));
}

export type SignOffDetail = {
  signOffId: string;
  organisationId: string;
  organisation: string;
  observationId: string;
  apprenticeId: string;
  apprentice: string;
  assessorId: string;
  assessor: string;
  workshopId: string;
  workshop: string;
  taskId: string;
  content: TaskContent;
  revisionNumber: number;
  contentHash: string;
  vehicle: string;
  jobCardNumber: string;
  startedAt: Date;
  signedAt: Date;
  outcome: Outcome;
  level: Level | null;
  currentUntil: string | null;
  feedback: string;
  reasons: { outcome: { key: string; text: string }[]; cap: { level: number; reasons: string[] } };
  leafIndex: number;
};

/** One sign-off with everything that it rests on, whoever asks: the caller asks the policy. */
export async function findSignOff(db: Db, signOffId: string): Promise<SignOffDetail | undefined> {
  const row = await db("sign_offs as s")
    .join("observations as o", "o.id", "s.observation_id")
    .join("task_revisions as r", "r.id", "s.task_revision_id")
    .join("people as p", "p.id", "s.apprentice_id")
    .join("people as a", "a.id", "s.assessor_id")
    .join("organisations as w", "w.id", "s.workshop_id")
    .join("organisations as g", "g.id", "s.organisation_id")
    .select(
      "s.id",
      "s.organisation_id",
      "g.name as organisation",
      "s.observation_id",
      "s.apprentice_id",
      "p.name as apprentice",
      "s.assessor_id",
      "a.name as assessor",
      "s.workshop_id",
      "w.name as workshop",
      "s.task_id",
      "r.content",
      "r.number",
      "r.content_hash",
      "o.vehicle",
      "o.job_card_number",
      "o.started_at",
      "s.signed_at",
      "s.outcome",
      "s.level",
      "s.current_until",
      "s.feedback",
      "s.reasons",
      "s.leaf_index",
    )
    .where("s.id", signOffId)
    .first();
  return (
    row && {
      signOffId: row.id,
      organisationId: row.organisation_id,
      organisation: row.organisation,
      observationId: row.observation_id,
      apprenticeId: row.apprentice_id,
      apprentice: row.apprentice,
      assessorId: row.assessor_id,
      assessor: row.assessor,
      workshopId: row.workshop_id,
      workshop: row.workshop,
      taskId: row.task_id,
      content: row.content,
      revisionNumber: row.number,
      contentHash: row.content_hash,
      vehicle: row.vehicle,
      jobCardNumber: row.job_card_number,
      startedAt: row.started_at,
      signedAt: row.signed_at,
      outcome: row.outcome,
      level: row.level,
      currentUntil: row.current_until,
      feedback: row.feedback,
      reasons: row.reasons,
      leafIndex: row.leaf_index,
    }
  );
}

export type SignOffChange = { kind: "correction" | "withdrawal"; reason: string; by: string; at: Date };

export async function listSignOffChanges(db: Db, signOffId: string): Promise<SignOffChange[]> {
  const rows = await db("sign_off_changes as c")
    .join("people as p", "p.id", "c.made_by")
    .select("c.kind", "c.reason", "p.name", "c.made_at")
    .where("c.sign_off_id", signOffId)
    .orderBy("c.made_at");
  return rows.map((row) => ({ kind: row.kind, reason: row.reason, by: row.name, at: row.made_at }));
}

/** Whether an organisation shares this apprentice's record today. */
export async function sharesRecord(db: Db, organisationId: string, apprenticeId: string): Promise<boolean> {
  const row = await db("training_agreements")
    .select("id")
    .where({ apprentice_id: apprenticeId })
    .where((side) => side.where({ workshop_id: organisationId }).orWhere({ college_id: organisationId }))
    .whereRaw("daterange(starts_on, ends_on, '[]') @> current_date")
    .first();
  return row !== undefined;
}
