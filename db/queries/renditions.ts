import type { Db } from "@/db/client";

export type RenditionKind = "480p" | "720p" | "poster" | "storyboard_sheet" | "storyboard_track";
export type Rendition = { recordingId: string; kind: RenditionKind; storeKey: string; mediaType: string; width: number | null; height: number | null };

/** What can be played and shown of these recordings, hidden ones left out. */
export async function listRenditions(db: Db, organisationId: string, recordingIds: string[]): Promise<Rendition[]> {
  const rows = await db("renditions as n")
    .join("files as f", "f.id", "n.file_id")
    .join("recordings as r", "r.id", "n.recording_id")
    .select("n.recording_id", "n.kind", "f.store_key", "f.media_type", "n.width", "n.height")
    .where("n.organisation_id", organisationId)
    .whereIn("n.recording_id", recordingIds)
    .whereNull("r.hidden_at");
  return rows.map((row) => ({
    recordingId: row.recording_id,
    kind: row.kind,
    storeKey: row.store_key,
    mediaType: row.media_type,
    width: row.width,
    height: row.height,
  }));
}

/** Caption tracks as WebVTT text, by recording. */
export async function listCaptions(db: Db, recordingIds: string[]): Promise<{ recordingId: string; language: string; vtt: string }[]> {
  const rows = await db("captions").select("recording_id", "language", "vtt").whereIn("recording_id", recordingIds).orderBy("language");
  return rows.map((row) => ({ recordingId: row.recording_id, language: row.language, vtt: row.vtt }));
}
