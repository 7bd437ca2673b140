import type { Db } from "@/db/client";
import { listCaptions, listRenditions, type RenditionKind } from "@/db/queries/renditions";
import type { Media } from "@/lib/schemas/media";
import { getStore } from "@/storage/store";

/** Long enough for a film of three hours with its pauses. */
const VALID_SECONDS = 6 * 3600;

/** Signed addresses of recordings' files. Who may play them is the caller's to decide. */
export async function signMedia(
  db: Db,
  organisationId: string,
  recordings: { id: string; durationMs: number | null }[],
): Promise<Media[]> {
  const ids = recordings.map((recording) => recording.id);
  const renditions = await listRenditions(db, organisationId, ids);
  const captions = await listCaptions(db, ids);
  const sign = async (recordingId: string, kind: RenditionKind): Promise<string | null> => {
    const file = renditions.find((rendition) => rendition.recordingId === recordingId && rendition.kind === kind);
    return file ? getStore().presignGet(file.storeKey, VALID_SECONDS, { responseContentType: file.mediaType }) : null;
  };
  return Promise.all(
    recordings.map(async ({ id, durationMs }) => ({
      recordingId: id,
      durationMs,
      p480: await sign(id, "480p"),
      p720: await sign(id, "720p"),
      poster: await sign(id, "poster"),
      storyboardSheet: await sign(id, "storyboard_sheet"),
      storyboardTrack: await sign(id, "storyboard_track"),
      captions: captions.filter((track) => track.recordingId === id).map(({ language, vtt }) => ({ language, vtt })),
    })),
  );
}
