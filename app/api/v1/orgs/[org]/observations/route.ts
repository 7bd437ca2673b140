import { door } from "@/lib/http/door";
import { startObservation } from "@/lib/services/observations/start-observation";

export const POST = door("POST /orgs/{org}/observations", ({ actor, body }) => startObservation(actor, body));
