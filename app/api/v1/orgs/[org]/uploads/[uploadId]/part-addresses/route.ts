import { door } from "@/lib/http/door";
import { signParts } from "@/lib/services/uploads/sign-parts";

export const POST = door("POST /orgs/{org}/uploads/{uploadId}/part-addresses", ({ actor, params, body }) =>
  signParts(actor, params.uploadId, body.partNumbers),
);
