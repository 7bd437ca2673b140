import { door } from "@/lib/http/door";
import { answer } from "@/lib/services/learning/answer";

export const POST = door("POST /orgs/{org}/assignments/{assignmentId}/answers", ({ actor, params, body }) =>
  answer(actor, params.assignmentId, body),
);
