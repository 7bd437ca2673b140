import { door } from "@/lib/http/door";
import { viewOutcome } from "@/lib/services/observations/view-outcome";

export const GET = door("GET /orgs/{org}/observations/{observationId}/outcome", ({ actor, params }) => viewOutcome(actor, params.observationId));
