import type { Knex } from "knex";
import type { Db } from "@/db/client";
import type { Level, Outcome } from "@/lib/core/tasks/types";

export type NewSignOff = {
  organisationId: string;
  observationId: string;
  apprenticeId: string;
  workshopId: string;
  assessorId: string;
  taskId: string;
  taskRevisionId: string;
  outcome: Outcome;
  level: Level | null;
  feedback: string;
  reasons: object;
  currentUntil: string | null;
  leafIndex: number;
};

/** Writes a sign-off, once per observation: a second one breaks the unique key. */
export async function insertSignOff(trx: Knex.Transaction, of: NewSignOff): Promise<string> {
  const [row] = await trx("sign_offs")
    .insert({
      organisation_id: of.organisationId,
      observation_id: of.observationId,
      apprentice_id: of.apprenticeId,
      workshop_id: of.workshopId,
      assessor_id: of.assessorId,
      task_id: of.taskId,
      task_revision_id: of.taskRevisionId,
      outcome: of.outcome,
      level: of.level,
      feedback: of.feedback,
      reasons: JSON.stringify(of.reasons),
      current_until: of.currentUntil,
      leaf_index: of.leafIndex,
    })
    .returning<{ id: string }[]>("id");
  if (!row) throw new Error("The sign-off's row did not come back.");
  return row.id;
}

export type PastObservation = { outcome: Outcome; vehicle: string; assessorId: string; signedOn: string };

/** Signed observations of a person on a task that still stand: what the levels' needs are counted from. */
export async function listStandingObservations(db: Db, of: { apprenticeId: string; taskId: string }): Promise<PastObservation[]> {
  const rows = await db("sign_offs as s")
    .join("observations as o", "o.id", "s.observation_id")
    .select("s.outcome", "o.vehicle", "s.assessor_id", db.raw("s.signed_at::date AS signed_on"))
    .where({ "s.apprentice_id": of.apprenticeId, "s.task_id": of.taskId })
    .whereNotExists(db("sign_off_changes as c").select(db.raw("1")).whereRaw("c.sign_off_id = s.id AND c.kind = 'withdrawal'"))
    .orderBy("s.signed_at");
  return rows.map((row) => ({ outcome: row.outcome, vehicle: row.vehicle, assessorId: row.assessor_id, signedOn: row.signed_on }));
}

export type SignOffParties = {
  id: string;
  organisationId: string;
  apprenticeId: string;
  assessorId: string;
  workshopId: string;
  taskId: string;
  level: Level | null;
};

/** A sign-off's parties, for policies. There is nothing to lock: the row never changes. */
export async function findSignOffParties(db: Db, organisationId: string, id: string): Promise<SignOffParties | undefined> {
  const row = await db("sign_offs")
    .select("id", "organisation_id", "apprentice_id", "assessor_id", "workshop_id", "task_id", "level")
    .where({ organisation_id: organisationId, id })
    .first();
  return (
    row && {
      id: row.id,
      organisationId: row.organisation_id,
      apprenticeId: row.apprentice_id,
      assessorId: row.assessor_id,
      workshopId: row.workshop_id,
      taskId: row.task_id,
      level: row.level,
    }
  );
}

export async function isWithdrawn(db: Db, signOffId: string): Promise<boolean> {
  const row = await db("sign_off_changes").select("id").where({ sign_off_id: signOffId, kind: "withdrawal" }).first();
  return row !== undefined;
}

export async function insertSignOffChange(
  trx: Knex.Transaction,
  of: { organisationId: string; signOffId: string; kind: "correction" | "withdrawal"; reason: string; madeBy: string; leafIndex: number },
): Promise<void> {
  await trx("sign_off_changes").insert({
    organisation_id: of.organisationId,
    sign_off_id: of.signOffId,
    kind: of.kind,
    reason: of.reason,
    made_by: of.madeBy,
    leaf_index: of.leafIndex,
  });
}
