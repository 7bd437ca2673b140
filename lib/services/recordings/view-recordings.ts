import { getDb } from "@/db/client";
import { listRecordings } from "@/db/reads/recordings";
import { assertAllowed } from "@/lib/core/decision";
import type { Actor } from "@/lib/core/roles";
import { canWorkOnRecordings } from "@/lib/policies/recordings";
import type { RecordingListItem } from "@/lib/schemas/recordings";
import { getStore } from "@/storage/store";

const POSTER_SECONDS = 6 * 3600;

/** The workshop's recordings, newest first, with signed posters. @throws AppError("forbidden") */
export async function viewRecordings(actor: Actor): Promise<RecordingListItem[]> {
  assertAllowed(canWorkOnRecordings(actor));
  const recordings = await listRecordings(getDb(), actor.organisation.id);
  return Promise.all(
    recordings.map(async ({ id, createdAt, posterKey, ...rest }) => ({
      ...rest,
      recordingId: id,
      createdAt: createdAt.toISOString(),
      poster: posterKey && (await getStore().presignGet(posterKey, POSTER_SECONDS, { responseContentType: "image/jpeg" })),
    })),
  );
}
