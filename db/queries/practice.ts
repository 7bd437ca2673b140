import type { Knex } from "knex";
import type { Db } from "@/db/client";

export type PracticeRun = {
  id: string;
  doneOn: string;
  vehicle: string;
  jobCardNumber: string;
  minutes: number;
  note: string;
  confirmedBy: string | null;
  confirmedAt: Date | null;
};

/** Logs a run; the same press sent twice gives the first one's id. */
export async function insertPracticeRun(
  trx: Knex.Transaction,
  of: {
    organisationId: string;
    apprenticeId: string;
    taskId: string;
    doneOn: string;
    vehicle: string;
    jobCardNumber: string;
    minutes: number;
    note: string;
    idempotencyKey: string;
  },
): Promise<string | undefined> {
  await trx("practice_runs")
    .insert({
      organisation_id: of.organisationId,
      apprentice_id: of.apprenticeId,
      task_id: of.taskId,
      done_on: of.doneOn,
      vehicle: of.vehicle,
      job_card_number: of.jobCardNumber,
      minutes: of.minutes,
      note: of.note,
      idempotency_key: of.idempotencyKey,
    })
    .onConflict("idempotency_key")
    .ignore();
  const row = await trx("practice_runs").select("id").where({ idempotency_key: of.idempotencyKey, apprentice_id: of.apprenticeId }).first();
  return row?.id;
}

export async function listPracticeRuns(db: Db, of: { apprenticeId: string; taskId: string }): Promise<PracticeRun[]> {
  const rows = await db("practice_runs as r")
    .leftJoin("people as p", "p.id", "r.confirmed_by")
    .select("r.id", "r.done_on", "r.vehicle", "r.job_card_number", "r.minutes", "r.note", "p.name as confirmed_by", "r.confirmed_at")
    .where({ "r.apprentice_id": of.apprenticeId, "r.task_id": of.taskId })
    .orderBy([{ column: "r.done_on", order: "desc" }, { column: "r.id", order: "desc" }]);
  return rows.map((row) => ({
    id: row.id,
    doneOn: row.done_on,
    vehicle: row.vehicle,
    jobCardNumber: row.job_card_number,
    minutes: row.minutes,
    note: row.note,
    confirmedBy: row.confirmed_by,
    confirmedAt: row.confirmed_at,
  }));
}

/** Locks a run of this workshop for confirming. */
export async function findPracticeRunForUpdate(
  trx: Knex.Transaction,
  organisationId: string,
  id: string,
): Promise<{ id: string; apprenticeId: string; confirmedAt: Date | null } | undefined> {
  const row = await trx("practice_runs").select("id", "apprentice_id", "confirmed_at").where({ organisation_id: organisationId, id }).forUpdate().first();
  return row && { id: row.id, apprenticeId: row.apprentice_id, confirmedAt: row.confirmed_at };
}

export async function setRunConfirmed(trx: Knex.Transaction, id: string, by: string): Promise<void> {
  await trx("practice_runs").where({ id }).update({ confirmed_by: by, confirmed_at: trx.fn.now() });
}

export type EvidencePhoto = { id: string; note: string; createdAt: Date; storeKey: string; mediaType: string };

export async function listEvidence(db: Db, of: { apprenticeId: string; taskId: string }): Promise<EvidencePhoto[]> {
  const rows = await db("evidence as e")
    .join("files as f", "f.id", "e.file_id")
    .select("e.id", "e.note", "e.created_at", "f.store_key", "f.media_type")
    .where({ "e.apprentice_id": of.apprenticeId, "e.task_id": of.taskId })
    .whereNull("e.removed_at")
    .orderBy("e.created_at");
  return rows.map((row) => ({ id: row.id, note: row.note, createdAt: row.created_at, storeKey: row.store_key, mediaType: row.media_type }));
}

export type OwnFile = { id: string; storeKey: string; sizeBytes: number; createdBy: string | null };

export async function findFile(db: Db, organisationId: string, id: string): Promise<OwnFile | undefined> {
  const row = await db("files").select("id", "store_key", "size_bytes", "created_by").where({ organisation_id: organisationId, id }).first();
  return row && { id: row.id, storeKey: row.store_key, sizeBytes: row.size_bytes, createdBy: row.created_by };
}

/** Ties a file to a task as evidence; the same file a second time gives undefined. */
export async function insertEvidence(
  trx: Knex.Transaction,
  of: { organisationId: string; apprenticeId: string; taskId: string; fileId: string; mediaType: string; note: string },
): Promise<string | undefined> {
  // What the store says when the picture is shown is what it really is, not what its name claimed.
  await trx("files").where({ id: of.fileId }).update({ media_type: of.mediaType });
  const [row] = await trx("evidence")
    .insert({
      organisation_id: of.organisationId,
      apprentice_id: of.apprenticeId,
      task_id: of.taskId,
      kind: "photo",
      file_id: of.fileId,
      note: of.note,
    })
    .onConflict("file_id")
    .ignore()
    .returning<{ id: string }[]>("id");
  return row?.id;
}

/** Takes evidence away from view; the row and the file stay. Returns whether there was any of this person's. */
export async function removeEvidence(trx: Knex.Transaction, of: { organisationId: string; apprenticeId: string; evidenceId: string }): Promise<boolean> {
  const changed = await trx("evidence")
    .where({ organisation_id: of.organisationId, apprentice_id: of.apprenticeId, id: of.evidenceId })
    .whereNull("removed_at")
    .update({ removed_at: trx.fn.now() });
  return changed === 1;
}

/** Opens "ready"; said twice it is one. */
export async function openReadiness(trx: Knex.Transaction, of: { organisationId: string; apprenticeId: string; taskId: string }): Promise<void> {
  await trx.raw(
    `INSERT INTO readiness (organisation_id, apprentice_id, task_id) VALUES (:organisationId, :apprenticeId, :taskId)
     ON CONFLICT (apprentice_id, task_id) WHERE ended_at IS NULL DO NOTHING`,
    of,
  );
}

export async function takeReadinessBack(trx: Knex.Transaction, of: { apprenticeId: string; taskId: string }): Promise<void> {
  await trx("readiness")
    .where({ apprentice_id: of.apprenticeId, task_id: of.taskId })
    .whereNull("ended_at")
    .update({ ended_at: trx.fn.now(), ended_because: "taken_back" });
}

/** Locks an open "ready" for booking. */
export async function findOpenReadinessForUpdate(trx: Knex.Transaction, id: string): Promise<{ id: string; apprenticeId: string; taskId: string } | undefined> {
  const row = await trx("readiness").select("id", "apprentice_id", "task_id").where({ id }).whereNull("ended_at").forUpdate().first();
  return row && { id: row.id, apprenticeId: row.apprentice_id, taskId: row.task_id };
}

export async function setBooking(trx: Knex.Transaction, id: string, booking: { startsAt: string; bookedBy: string }): Promise<void> {
  await trx("readiness").where({ id }).update({ booked_for: booking.startsAt, booked_by: booking.bookedBy });
}
