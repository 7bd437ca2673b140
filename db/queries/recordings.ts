import type { Knex } from "knex";
import type { Db } from "@/db/client";

export type RecordingState = "processing" | "ready" | "failed";
export type Consent = "nobody_in_shot" | "consent_given";

/** What a change of a recording has to know of it. */
export type RecordingCore = { id: string; organisationId: string; state: RecordingState; durationMs: number | null };

export async function insertRecording(
  trx: Knex.Transaction,
  of: { id: string; organisationId: string; title: string; recordedBy: string; sourceFileId: string },
): Promise<void> {
  await trx("recordings").insert({
    id: of.id,
    organisation_id: of.organisationId,
    title: of.title,
    recorded_by: of.recordedBy,
    upload_id: of.id,
    source_file_id: of.sourceFileId,
  });
}

const core = (db: Db, organisationId: string, id: string) =>
  db("recordings").select("id", "organisation_id", "state", "duration_ms").where({ organisation_id: organisationId, id }).whereNull("hidden_at");

const toCore = (row: Awaited<ReturnType<typeof core>>[number]): RecordingCore => ({
  id: row.id,
  organisationId: row.organisation_id,
  state: row.state,
  durationMs: row.duration_ms,
});

/** A recording that was not put away. */
export async function findRecording(db: Db, organisationId: string, id: string): Promise<RecordingCore | undefined> {
  const row = await core(db, organisationId, id).first();
  return row && toCore(row);
}

/** Locks the recording until the transaction ends. */
export async function findRecordingForUpdate(trx: Knex.Transaction, organisationId: string, id: string): Promise<RecordingCore | undefined> {
  const row = await core(trx, organisationId, id).forUpdate().first();
  return row && toCore(row);
}

export type RecordingChange = {
  title?: string | undefined;
  vehicleId?: string | null | undefined;
  consent?: Consent | undefined;
  consentNote?: string | undefined;
};

/** Writes the given details; what is left out stays. */
export async function updateRecordingDetails(trx: Knex.Transaction, id: string, change: RecordingChange): Promise<void> {
  const row = { title: change.title, vehicle_id: change.vehicleId, consent: change.consent, consent_note: change.consentNote };
  const given = Object.fromEntries(Object.entries(row).filter(([, value]) => value !== undefined));
  if (Object.keys(given).length > 0) await trx("recordings").where({ id }).update(given);
}

/** Notes who looked for plates, numbers and papers in the picture, or takes the note back. */
export async function setPrivateDetailsChecked(trx: Knex.Transaction, id: string, by: string | null): Promise<void> {
  await trx("recordings").where({ id }).update({ private_details_checked_at: by ? trx.fn.now() : null, private_details_checked_by: by });
}

export async function setHidden(trx: Knex.Transaction, id: string): Promise<void> {
  await trx("recordings").where({ id }).update({ hidden_at: trx.fn.now() });
}

/** Whether a module, published or in draft, is made of this recording's steps. */
export async function isInModules(db: Db, id: string): Promise<boolean> {
  const { rows } = await db.raw(
    `SELECT EXISTS (SELECT 1 FROM module_revision_recordings WHERE recording_id = :id)
         OR EXISTS (SELECT 1 FROM module_steps m JOIN steps s ON s.id = m.step_id WHERE s.recording_id = :id) AS used`,
    { id },
  );
  return rows[0].used;
}

/** The workshop's vehicle of that label, made if there is none; its model is written anew. */
export async function putVehicle(trx: Knex.Transaction, of: { organisationId: string; label: string; model: string }): Promise<string> {
  const [row] = await trx("vehicles")
    .insert({ organisation_id: of.organisationId, label: of.label, model: of.model })
    .onConflict(["organisation_id", "label"])
    .merge(["model"])
    .returning<{ id: string }[]>("id");
  if (!row) throw new Error("The vehicle's row was not written.");
  return row.id;
}

export async function findVehicle(db: Db, organisationId: string, id: string): Promise<{ id: string } | undefined> {
  return db("vehicles").select("id").where({ organisation_id: organisationId, id }).first();
}

/** Keeps a caption track, in place of an earlier one in that language. */
export async function putCaptions(trx: Knex.Transaction, of: { recordingId: string; language: string; vtt: string }): Promise<void> {
  await trx("captions")
    .insert({ recording_id: of.recordingId, language: of.language, vtt: of.vtt })
    .onConflict(["recording_id", "language"])
    .merge({ vtt: of.vtt, updated_at: trx.fn.now() });
}

const STAGES = ["probe", "480p", "720p", "poster", "storyboard"] as const;
export type Stage = (typeof STAGES)[number];

export async function insertStages(trx: Knex.Transaction, recordingId: string): Promise<void> {
  await trx("recording_stages").insert(STAGES.map((stage) => ({ recording_id: recordingId, stage })));
}

/** Puts what failed back to waiting and the recording back to being prepared. What is done stays done. */
export async function resetFailedStages(trx: Knex.Transaction, recordingId: string): Promise<void> {
  await trx("recording_stages")
    .where({ recording_id: recordingId })
    .whereNot({ state: "done" })
    .update({ state: "waiting", percent: 0, attempt: 0, failure: null, lease_until: null, started_at: null, finished_at: null });
  await trx("recordings").where({ id: recordingId }).update({ state: "processing", failure: null });
}
