import { door } from "@/lib/http/door";
import { withdrawSignOff } from "@/lib/services/observations/withdraw-sign-off";

export const POST = door("POST /orgs/{org}/sign-offs/{signOffId}/withdrawal", ({ actor, params, body }) =>
  withdrawSignOff(actor, params.signOffId, body),
);
