import type { Knex } from "knex";
import type { Db } from "@/db/client";
import type { CriterionMark, TaskContent } from "@/lib/core/tasks/types";

export type Sheet = {
  id: string;
  organisationId: string;
  apprenticeId: string;
  apprenticeName: string;
  workshopId: string;
  workshopSlug: string;
  assessorId: string;
  taskId: string;
  taskRevisionId: string;
  content: TaskContent;
  contentHash: string;
  revisionNumber: number;
  vehicle: string;
  jobCardNumber: string;
  state: "open" | "signed" | "dropped";
  stoppedReason: string | null;
  startedAt: Date;
};

const sheets = (db: Db, organisationId: string, id: string) =>
  db("observations as o")
    .join("task_revisions as r", "r.id", "o.task_revision_id")
    .join("people as p", "p.id", "o.apprentice_id")
    .join("organisations as w", "w.id", "o.workshop_id")
    .select(
      "o.id",
      "o.organisation_id",
      "o.apprentice_id",
      "p.name as apprentice_name",
      "o.workshop_id",
      "w.slug as workshop_slug",
      "o.assessor_id",
      "o.task_id",
      "o.task_revision_id",
      "r.content",
      "r.content_hash",
      "r.number",
      "o.vehicle",
      "o.job_card_number",
      "o.state",
      "o.stopped_reason",
      "o.started_at",
    )
    .where({ "o.organisation_id": organisationId, "o.id": id });

const toSheet = (row: Awaited<ReturnType<typeof sheets>>[number]): Sheet => ({
  id: row.id,
  organisationId: row.organisation_id,
  apprenticeId: row.apprentice_id,
  apprenticeName: row.apprentice_name,
  workshopId: row.workshop_id,
  workshopSlug: row.workshop_slug,
  assessorId: row.assessor_id,
  taskId: row.task_id,
  taskRevisionId: row.task_revision_id,
  content: row.content,
  contentHash: row.content_hash,
  revisionNumber: row.number,
  vehicle: row.vehicle,
  jobCardNumber: row.job_card_number,
  state: row.state,
  stoppedReason: row.stopped_reason,
  startedAt: row.started_at,
});

export async function findSheet(db: Db, organisationId: string, id: string): Promise<Sheet | undefined> {
  const row = await sheets(db, organisationId, id).first();
  return row && toSheet(row);
}

/** Locks the sheet until the transaction ends, so that it can't be marked while it is being signed, nor signed twice. */
export async function findSheetForUpdate(trx: Knex.Transaction, organisationId: string, id: string): Promise<Sheet | undefined> {
  const row = await sheets(trx, organisationId, id).forUpdate("o").first();
  return row && toSheet(row);
}

export async function findSheetByKey(db: Db, key: string): Promise<{ id: string; assessorId: string } | undefined> {
  const row = await db("observations").select("id", "assessor_id").where({ idempotency_key: key }).first();
  return row && { id: row.id, assessorId: row.assessor_id };
}

/** Opens a sheet; undefined where this press was taken already or the assessor has one open for the same task and apprentice. */
export async function insertSheet(
  trx: Knex.Transaction,
  of: {
    organisationId: string;
    apprenticeId: string;
    workshopId: string;
    assessorId: string;
    taskId: string;
    taskRevisionId: string;
    vehicle: string;
    jobCardNumber: string;
    idempotencyKey: string;
  },
): Promise<string | undefined> {
  const [row] = await trx("observations")
    .insert({
      organisation_id: of.organisationId,
      apprentice_id: of.apprenticeId,
      workshop_id: of.workshopId,
      assessor_id: of.assessorId,
      task_id: of.taskId,
      task_revision_id: of.taskRevisionId,
      vehicle: of.vehicle,
      job_card_number: of.jobCardNumber,
      idempotency_key: of.idempotencyKey,
    })
    .onConflict()
    .ignore()
    .returning<{ id: string }[]>("id");
  return row?.id;
}

export async function findOpenSheet(
  db: Db,
  of: { organisationId: string; apprenticeId: string; taskId: string; assessorId: string },
): Promise<string | undefined> {
  const row = await db("observations")
    .select("id")
    .where({
      organisation_id: of.organisationId,
      apprentice_id: of.apprenticeId,
      task_id: of.taskId,
      assessor_id: of.assessorId,
      state: "open",
    })
    .first();
  return row?.id;
}

/** Marks of a sheet. Whether the instrument was in date is judged on the day the sheet was begun. */
export async function listMarks(db: Db, sheet: { id: string; startedAt: Date }): Promise<CriterionMark[]> {
  const rows = await db("observation_marks as m")
    .leftJoin("instruments as i", "i.id", "m.instrument_id")
    .select("m.criterion_key", "m.mark", "m.reading_value", "m.reading_unit", "m.instrument_id", "m.prompts", "m.remark")
    .select(db.raw("i.calibration_due_on >= ?::timestamptz::date AS in_date", [sheet.startedAt]))
    .where("m.observation_id", sheet.id);
  return rows.map((row) => ({
    key: row.criterion_key,
    mark: row.mark,
    reading:
      row.reading_value === null
        ? null
        : { value: row.reading_value, unit: row.reading_unit, instrumentId: row.instrument_id, instrumentInDate: row.in_date },
    prompts: row.prompts,
    remark: row.remark,
  }));
}

export async function upsertMark(trx: Knex.Transaction, sheet: { organisationId: string; id: string }, mark: CriterionMark): Promise<void> {
  await trx("observation_marks")
    .insert({
      organisation_id: sheet.organisationId,
      observation_id: sheet.id,
      criterion_key: mark.key,
      mark: mark.mark,
      reading_value: mark.reading?.value ?? null,
      reading_unit: mark.reading?.unit ?? null,
      instrument_id: mark.reading?.instrumentId ?? null,
      prompts: mark.prompts,
      remark: mark.remark,
      updated_at: trx.fn.now(),
    })
    .onConflict(["observation_id", "criterion_key"])
    .merge();
}

export async function setStopped(trx: Knex.Transaction, id: string, reason: string): Promise<void> {
  await trx("observations").where({ id }).update({ stopped_reason: reason });
}

export async function setSigned(trx: Knex.Transaction, id: string): Promise<void> {
  await trx("observations").where({ id }).update({ state: "signed", ended_at: trx.fn.now() });
}

/** Ends "ready" for the task: the apprentice has been observed. */
export async function endReadiness(trx: Knex.Transaction, of: { apprenticeId: string; taskId: string }): Promise<void> {
  await trx("readiness")
    .where({ apprentice_id: of.apprenticeId, task_id: of.taskId })
    .whereNull("ended_at")
    .update({ ended_at: trx.fn.now(), ended_because: "observed" });
}

export async function isReady(db: Db, of: { apprenticeId: string; taskId: string }): Promise<boolean> {
  const row = await db("readiness")
    .select("id")
    .where({ apprentice_id: of.apprenticeId, task_id: of.taskId })
    .whereNull("ended_at")
    .first();
  return row !== undefined;
}
