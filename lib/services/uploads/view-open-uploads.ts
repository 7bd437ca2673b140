import { getDb } from "@/db/client";
import { listOpenUploads } from "@/db/queries/uploads";
import type { Actor } from "@/lib/core/roles";
import type { UploadView } from "@/lib/schemas/uploads";

/** One's own uploads that did not finish: pick the same file again to go on, or give it up. */
export async function viewOpenUploads(actor: Actor): Promise<Omit<UploadView, "receivedParts" | "receivedBytes">[]> {
  const uploads = await listOpenUploads(getDb(), { organisationId: actor.organisation.id, personId: actor.personId });
  return uploads.map(({ id, purpose, fileName, sizeBytes, modifiedMs, partSizeBytes, state }) => ({
    uploadId: id,
    purpose,
    fileName,
    sizeBytes,
    modifiedMs,
    partSizeBytes,
    state,
  }));
}
