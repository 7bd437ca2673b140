import { getDb } from "@/db/client";
import { findAssignment, listDurations } from "@/db/queries/learning";
import type { Actor } from "@/lib/core/roles";
import type { Media } from "@/lib/schemas/media";
import { myAssignment, recordingIdsOf } from "@/lib/services/learning/my-assignment";
import { signMedia } from "@/lib/services/recordings/sign-media";

/**
 * Signed addresses of the films that a module plays.
 * @throws AppError("not_found" | "forbidden" | "gone")
 */
export async function viewMedia(actor: Actor, assignmentId: string): Promise<{ media: Media[] }> {
  const db = getDb();
  const assignment = myAssignment(actor, await findAssignment(db, actor.organisation.id, assignmentId));
  const durations = await listDurations(db, assignment.organisationId, recordingIdsOf(assignment));
  const recordings = [...durations].map(([id, durationMs]) => ({ id, durationMs }));
  return { media: await signMedia(db, assignment.organisationId, recordings) };
}
