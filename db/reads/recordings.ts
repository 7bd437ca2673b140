import type { Db } from "@/db/client";
import type { Consent, RecordingState, Stage } from "@/db/queries/recordings";

export type RecordingListItem = {
  id: string;
  title: string;
  state: RecordingState;
  failure: string | null;
  percent: number;
  durationMs: number | null;
  vehicle: string | null;
  steps: number;
  recordedBy: string;
  createdAt: Date;
  posterKey: string | null;
};

/** All recordings of a workshop that were not put away, newest first; one query however many there are. */
export async function listRecordings(db: Db, organisationId: string): Promise<RecordingListItem[]> {
  const { rows } = await db.raw(
    `SELECT r.id, r.title, r.state, r.failure, r.duration_ms, v.label AS vehicle, p.name AS recorded_by, r.created_at, f.store_key AS poster_key,
       coalesce(s.steps, 0) AS steps, coalesce(g.percent, 0) AS percent
     FROM recordings r
     JOIN people p ON p.id = r.recorded_by
     LEFT JOIN vehicles v ON v.id = r.vehicle_id
     LEFT JOIN renditions n ON n.recording_id = r.id AND n.kind = 'poster'
     LEFT JOIN files f ON f.id = n.file_id
     LEFT JOIN (SELECT recording_id, count(*) AS steps FROM steps WHERE organisation_id = :organisationId GROUP BY recording_id) s
       ON s.recording_id = r.id
     LEFT JOIN LATERAL (SELECT floor(avg(percent))::int AS percent FROM recording_stages WHERE recording_id = r.id) g ON r.state = 'processing'
     WHERE r.organisation_id = :organisationId AND r.hidden_at IS NULL
     ORDER BY r.created_at DESC, r.id DESC`,
    { organisationId },
  );
  return rows.map((row: Record<string, never>) => ({
    id: row.id,
    title: row.title,
    state: row.state,
    failure: row.failure,
    percent: row.percent,
    durationMs: row.duration_ms,
    vehicle: row.vehicle,
    steps: row.steps,
    recordedBy: row.recorded_by,
    createdAt: row.created_at,
    posterKey: row.poster_key,
  }));
}

export type StageRow = { stage: Stage; state: "waiting" | "running" | "done" | "failed"; percent: number; failure: string | null };

export type RecordingDetail = {
  id: string;
  title: string;
  state: RecordingState;
  failure: string | null;
  durationMs: number | null;
  width: number | null;
  height: number | null;
  hasSound: boolean | null;
  vehicleId: string | null;
  consent: Consent | null;
  consentNote: string;
  privateDetailsCheckedAt: Date | null;
  privateDetailsCheckedBy: string | null;
  recordedBy: string;
  createdAt: Date;
  fileName: string | null;
  sizeBytes: number;
  steps: number;
  questions: number;
  stages: StageRow[];
  modules: { moduleId: string; title: string }[];
};

/** One recording with its stages and the modules that are made of it, in one query. */
export async function findRecordingDetail(db: Db, organisationId: string, id: string): Promise<RecordingDetail | undefined> {
  const { rows } = await db.raw(
    `SELECT r.id, r.title, r.state, r.failure, r.duration_ms, r.width, r.height, r.has_sound, r.vehicle_id, r.consent, r.consent_note,
       r.private_details_checked_at, c.name AS private_details_checked_by, p.name AS recorded_by, r.created_at, u.file_name, f.size_bytes,
       (SELECT count(*) FROM steps WHERE recording_id = r.id) AS steps,
       (SELECT count(*) FROM questions WHERE recording_id = r.id) AS questions,
       (SELECT coalesce(json_agg(json_build_object('stage', stage, 'state', state, 'percent', percent, 'failure', failure)
            ORDER BY array_position(ARRAY['probe', '480p', '720p', 'poster', 'storyboard'], stage)), '[]')
          FROM recording_stages WHERE recording_id = r.id) AS stages,
       (SELECT coalesce(json_agg(json_build_object('moduleId', m.id, 'title', m.title) ORDER BY m.title, m.id), '[]')
          FROM modules m WHERE m.organisation_id = r.organisation_id AND m.retired_at IS NULL AND (
            EXISTS (SELECT 1 FROM module_steps ms JOIN steps s ON s.id = ms.step_id WHERE ms.module_id = m.id AND s.recording_id = r.id)
            OR EXISTS (SELECT 1 FROM module_revisions mr JOIN module_revision_recordings rr ON rr.module_revision_id = mr.id
              WHERE mr.module_id = m.id AND rr.recording_id = r.id))) AS modules
     FROM recordings r
     JOIN people p ON p.id = r.recorded_by
     JOIN files f ON f.id = r.source_file_id
     LEFT JOIN uploads u ON u.id = r.upload_id
     LEFT JOIN people c ON c.id = r.private_details_checked_by
     WHERE r.organisation_id = ? AND r.id = ? AND r.hidden_at IS NULL`,
    [organisationId, id],
  );
  const row = rows[0];
  return (
    row && {
      id: row.id,
      title: row.title,
      state: row.state,
      failure: row.failure,
      durationMs: row.duration_ms,
      width: row.width,
      height: row.height,
      hasSound: row.has_sound,
      vehicleId: row.vehicle_id,
      consent: row.consent,
      consentNote: row.consent_note,
      privateDetailsCheckedAt: row.private_details_checked_at,
      privateDetailsCheckedBy: row.private_details_checked_by,
      recordedBy: row.recorded_by,
      createdAt: row.created_at,
      fileName: row.file_name,
      sizeBytes: row.size_bytes,
      steps: row.steps,
      questions: row.questions,
      stages: row.stages,
      modules: row.modules,
    }
  );
}

/** The workshop's vehicles by label, for choosing one. */
export async function listVehicles(db: Db, organisationId: string): Promise<{ id: string; label: string; model: string }[]> {
  return db("vehicles").select("id", "label", "model").where({ organisation_id: organisationId }).orderBy("label");
}
