import { door } from "@/lib/http/door";
import { recordSpans } from "@/lib/services/learning/record-spans";

export const POST = door("POST /orgs/{org}/assignments/{assignmentId}/spans", ({ actor, params, body }) =>
  recordSpans(actor, params.assignmentId, body),
);
