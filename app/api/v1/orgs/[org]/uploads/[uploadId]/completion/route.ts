import { door } from "@/lib/http/door";
import { completeUpload } from "@/lib/services/uploads/complete-upload";

export const POST = door("POST /orgs/{org}/uploads/{uploadId}/completion", ({ actor, params }) => completeUpload(actor, params.uploadId));
