import { getDb } from "@/db/client";
import { findUpload } from "@/db/queries/uploads";
import type { Actor } from "@/lib/core/roles";
import type { UploadView } from "@/lib/schemas/uploads";
import { describeUpload } from "@/lib/services/uploads/describe-upload";
import { myUpload } from "@/lib/services/uploads/my-upload";

/** How far an upload of one's own is. @throws AppError("not_found" | "gone" | "unavailable") */
export async function viewUpload(actor: Actor, uploadId: string): Promise<UploadView> {
  return describeUpload(myUpload(actor, await findUpload(getDb(), actor.organisation.id, uploadId)));
}
