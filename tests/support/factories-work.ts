import { randomUUID } from "node:crypto";
import { getDb } from "@/db/client";
import type { Actor } from "@/lib/core/roles";

/** A recording of the mentor's workshop with nothing marked out. A failed one says why. */
export async function createRecording(mentor: Actor, over: { failed?: boolean; title?: string } = {}): Promise<string> {
  const organisation_id = mentor.organisation.id;
  const [file] = await getDb()("files")
    .insert({ organisation_id, store_key: `test/${randomUUID()}`, media_type: "video/mp4", size_bytes: 1, created_by: mentor.personId })
    .returning<{ id: string }[]>("id");
  const state = over.failed ? { state: "failed", failure: "The film could not be read." } : { state: "ready", duration_ms: 60_000 };
  const [recording] = await getDb()("recordings")
    .insert({ organisation_id, title: over.title ?? "A test film", recorded_by: mentor.personId, source_file_id: file?.id, ...state })
    .returning<{ id: string }[]>("id");
  if (!recording) throw new Error("The recording's row did not come back.");
  return recording.id;
}
