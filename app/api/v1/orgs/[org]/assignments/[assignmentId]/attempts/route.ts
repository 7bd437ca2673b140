import { door } from "@/lib/http/door";
import { ask } from "@/lib/services/learning/ask";

export const POST = door("POST /orgs/{org}/assignments/{assignmentId}/attempts", ({ actor, params, body }) =>
  ask(actor, params.assignmentId, body.questionId),
);
