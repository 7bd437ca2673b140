import { getDb } from "@/db/client";
import { findRecording } from "@/db/queries/recordings";
import type { Actor } from "@/lib/core/roles";
import type { Media } from "@/lib/schemas/media";
import { signMedia } from "@/lib/services/recordings/sign-media";
import { workOn } from "@/lib/services/recordings/work-on";

/** Signed addresses of what is made of a recording so far. @throws AppError("forbidden" | "not_found") */
export async function viewRecordingMedia(actor: Actor, recordingId: string): Promise<Media> {
  const db = getDb();
  const recording = workOn(actor, await findRecording(db, actor.organisation.id, recordingId));
  const [media] = await signMedia(db, recording.organisationId, [recording]);
  return workOn(actor, media);
}
