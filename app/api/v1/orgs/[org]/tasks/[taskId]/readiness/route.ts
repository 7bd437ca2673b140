import { door } from "@/lib/http/door";
import { declareReady, takeReadyBack } from "@/lib/services/practice/declare-ready";

export const PUT = door("PUT /orgs/{org}/tasks/{taskId}/readiness", ({ actor, params }) => declareReady(actor, params.taskId));
export const DELETE = door("DELETE /orgs/{org}/tasks/{taskId}/readiness", ({ actor, params }) => takeReadyBack(actor, params.taskId));
