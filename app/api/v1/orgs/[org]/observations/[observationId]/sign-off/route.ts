import { door } from "@/lib/http/door";
import { signObservation } from "@/lib/services/observations/sign-observation";

export const POST = door("POST /orgs/{org}/observations/{observationId}/sign-off", ({ actor, params, body }) =>
  signObservation(actor, params.observationId, body),
);
