import type { Db } from "@/db/client";
import type { Level, Outcome } from "@/lib/core/tasks/types";

export type SignedObservation = {
  signOffId: string;
  outcome: Outcome;
  level: Level | null;
  signedAt: Date;
  assessor: string;
  vehicle: string;
  reasons: string[];
  feedback: string;
  withdrawn: boolean;
};

/** Signed observations of one person on one task, newest first. */
export async function listSignedObservations(db: Db, of: { apprenticeId: string; taskId: string }): Promise<SignedObservation[]> {
  const rows = await db("sign_offs as s")
    .join("people as p", "p.id", "s.assessor_id")
    .join("observations as o", "o.id", "s.observation_id")
    .select("s.id", "s.outcome", "s.level", "s.signed_at", "p.name", "o.vehicle", "s.reasons", "s.feedback")
    .select(db.raw("EXISTS (SELECT 1 FROM sign_off_changes c WHERE c.sign_off_id = s.id AND c.kind = 'withdrawal') AS withdrawn"))
    .where({ "s.apprentice_id": of.apprenticeId, "s.task_id": of.taskId })
    .orderBy("s.signed_at", "desc");
  return rows.map((row) => ({
    signOffId: row.id,
    outcome: row.outcome,
    level: row.level,
    signedAt: row.signed_at,
    assessor: row.name,
    vehicle: row.vehicle,
    reasons: (row.reasons?.outcome ?? []).map((reason: { text: string }) => reason.text),
    feedback: row.feedback,
    withdrawn: row.withdrawn,
  }));
}

/** Modules that open a task and that an apprentice holds at a workshop: where to learn for it. */
export async function listModulesFor(db: Db, of: { organisationId: string; apprenticeId: string; taskId: string }): Promise<{ assignmentId: string; title: string; known: boolean }[]> {
  const rows = await db("assignments as a")
    .join("module_revisions as r", "r.id", "a.module_revision_id")
    .join("module_revision_tasks as t", "t.module_revision_id", "r.id")
    .select("a.id", "a.knowledge_met_at", db.raw("r.content ->> 'title' AS title"))
    .where({ "a.organisation_id": of.organisationId, "a.apprentice_id": of.apprenticeId, "t.task_id": of.taskId })
    .whereNull("a.withdrawn_at")
    .orderBy("a.due_on");
  return rows.map((row) => ({ assignmentId: row.id, title: row.title, known: row.knowledge_met_at !== null }));
}
