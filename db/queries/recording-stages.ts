import type { Knex } from "knex";
import type { Db } from "@/db/client";
import type { RenditionKind } from "@/db/queries/renditions";
import type { Stage } from "@/db/queries/recordings";

/** How long a stage is held without a sign of life. Whoever works on it gives one several times within. */
export const LEASE_SECONDS = 60;

const ORDER = `array_position(ARRAY['probe', '480p', '720p', 'poster', 'storyboard'], stage)`;

/** A stage that this worker holds. `attempt` tells it from an earlier holder that was taken for dead. */
export type ClaimedStage = { recordingId: string; stage: Stage; attempt: number };

/**
 * Takes the recording's next stage that is not done, if nobody holds it: the one that is waiting, or one whose holder gave no sign of life
 * within its lease. Stages are done in their order, one at a time.
 */
export async function claimNextStage(trx: Knex.Transaction, recordingId: string): Promise<ClaimedStage | undefined> {
  // The recording's row is the lock: of two workers the second waits and then finds the stage held.
  const recording = await trx("recordings").select("state").where({ id: recordingId }).forUpdate().first();
  if (recording?.state !== "processing") return undefined;
  const { rows } = await trx.raw(
    `UPDATE recording_stages s
     SET state = 'running', attempt = attempt + 1, percent = 0, failure = NULL, finished_at = NULL,
         started_at = clock_timestamp(), lease_until = clock_timestamp() + make_interval(secs => :lease)
     WHERE s.recording_id = :recordingId
       AND s.stage = (SELECT stage FROM recording_stages WHERE recording_id = :recordingId AND state <> 'done' ORDER BY ${ORDER} LIMIT 1)
       AND (s.state = 'waiting' OR (s.state = 'running' AND s.lease_until < clock_timestamp()))
     RETURNING s.stage, s.attempt`,
    { recordingId, lease: LEASE_SECONDS },
  );
  return rows[0] && { recordingId, stage: rows[0].stage, attempt: rows[0].attempt };
}

/** Locks the recording before its stages, in the order in which everybody does. */
export async function lockRecording(trx: Knex.Transaction, recordingId: string): Promise<void> {
  await trx("recordings").select("id").where({ id: recordingId }).forUpdate();
}

const held = (db: Db, { recordingId, stage, attempt }: ClaimedStage) =>
  db("recording_stages").where({ recording_id: recordingId, stage, attempt, state: "running" });

/** A sign of life, with how far the work is. Returns whether the stage is still held by this attempt. */
export async function renewLease(db: Db, claim: ClaimedStage, percent: number): Promise<boolean> {
  const changed = await held(db, claim).update({
    percent: Math.max(0, Math.min(100, Math.round(percent))),
    lease_until: db.raw(`clock_timestamp() + make_interval(secs => ?)`, [LEASE_SECONDS]),
  });
  return changed === 1;
}

/** Returns whether the stage was still held by this attempt; otherwise nothing is written. */
export async function finishStage(trx: Knex.Transaction, claim: ClaimedStage): Promise<boolean> {
  const changed = await held(trx, claim).update({ state: "done", percent: 100, lease_until: null, finished_at: trx.fn.now() });
  return changed === 1;
}

/** Gives the stage back as it was, for another try; this one does not count. */
export async function releaseStage(db: Db, claim: ClaimedStage): Promise<void> {
  await held(db, claim).update({ state: "waiting", attempt: claim.attempt - 1, percent: 0, lease_until: null });
}

/** Notes why the stage, and with it the recording, could not be prepared. Returns whether this attempt still held it. */
export async function failStage(trx: Knex.Transaction, claim: ClaimedStage, reason: string): Promise<boolean> {
  const changed = await held(trx, claim).update({ state: "failed", lease_until: null, failure: reason, finished_at: trx.fn.now() });
  if (changed === 1) await trx("recordings").where({ id: claim.recordingId }).update({ state: "failed", failure: reason });
  return changed === 1;
}

/** Makes the recording ready if all its stages are done. */
export async function markReadyIfDone(trx: Knex.Transaction, recordingId: string): Promise<void> {
  await trx("recordings")
    .where({ id: recordingId, state: "processing" })
    .whereNotExists(trx("recording_stages").select(trx.raw("1")).where({ recording_id: recordingId }).whereNot({ state: "done" }))
    .update({ state: "ready" });
}

export type SourceFacts = { durationMs: number; width: number; height: number; hasSound: boolean };
export type RecordingSource = { organisationId: string; storeKey: string } & { [Fact in keyof SourceFacts]: SourceFacts[Fact] | null };

/** Where the recording's source is, and what probing found out about it. */
export async function findSource(db: Db, recordingId: string): Promise<RecordingSource | undefined> {
  const row = await db("recordings as r")
    .join("files as f", "f.id", "r.source_file_id")
    .select("r.organisation_id", "f.store_key", "r.duration_ms", "r.width", "r.height", "r.has_sound")
    .where("r.id", recordingId)
    .first();
  return (
    row && {
      organisationId: row.organisation_id,
      storeKey: row.store_key,
      durationMs: row.duration_ms,
      width: row.width,
      height: row.height,
      hasSound: row.has_sound,
    }
  );
}

export async function setSourceFacts(trx: Knex.Transaction, recordingId: string, facts: SourceFacts): Promise<void> {
  await trx("recordings")
    .where({ id: recordingId })
    .update({ duration_ms: facts.durationMs, width: facts.width, height: facts.height, has_sound: facts.hasSound });
}

export async function putRendition(
  trx: Knex.Transaction,
  of: { organisationId: string; recordingId: string; kind: RenditionKind; fileId: string; width: number | null; height: number | null },
): Promise<void> {
  await trx("renditions")
    .insert({
      organisation_id: of.organisationId,
      recording_id: of.recordingId,
      kind: of.kind,
      file_id: of.fileId,
      width: of.width,
      height: of.height,
    })
    .onConflict(["recording_id", "kind"])
    .merge(["file_id", "width", "height"]);
}

/**
 * Recordings that should be worked on and are not: nobody holds a stage, and no job waits for a worker. That is so after a worker was
 * killed. Locked, so that two sweeps at once name each only once.
 */
export async function listForsaken(trx: Knex.Transaction): Promise<string[]> {
  const { rows } = await trx.raw(
    `SELECT r.id FROM recordings r
     WHERE r.state = 'processing' AND r.hidden_at IS NULL
       AND NOT EXISTS (SELECT 1 FROM recording_stages s
         WHERE s.recording_id = r.id AND s.state = 'running' AND s.lease_until >= clock_timestamp())
       AND NOT EXISTS (SELECT 1 FROM pgboss.job j
         WHERE j.name = 'process-recording' AND j.state IN ('created', 'retry') AND j.data ->> 'recordingId' = r.id::text)
     ORDER BY r.created_at
     FOR UPDATE OF r SKIP LOCKED`,
  );
  return rows.map((row: { id: string }) => row.id);
}
