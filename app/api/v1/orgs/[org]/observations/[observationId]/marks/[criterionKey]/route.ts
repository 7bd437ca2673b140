import { door } from "@/lib/http/door";
import { markCriterion } from "@/lib/services/observations/mark-criterion";

export const PUT = door("PUT /orgs/{org}/observations/{observationId}/marks/{criterionKey}", ({ actor, params, body }) =>
  markCriterion(actor, params, body),
);
