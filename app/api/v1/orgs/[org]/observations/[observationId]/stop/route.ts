import { door } from "@/lib/http/door";
import { stopForSafety } from "@/lib/services/observations/stop-for-safety";

export const POST = door("POST /orgs/{org}/observations/{observationId}/stop", ({ actor, params, body }) =>
  stopForSafety(actor, params.observationId, body.reason),
);
