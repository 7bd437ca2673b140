import { door } from "@/lib/http/door";
import { cancelUpload } from "@/lib/services/uploads/cancel-upload";
import { viewUpload } from "@/lib/services/uploads/view-upload";

export const GET = door("GET /orgs/{org}/uploads/{uploadId}", ({ actor, params }) => viewUpload(actor, params.uploadId));
export const DELETE = door("DELETE /orgs/{org}/uploads/{uploadId}", ({ actor, params }) => cancelUpload(actor, params.uploadId));
