import { door } from "@/lib/http/door";
import { logPracticeRun } from "@/lib/services/practice/log-practice-run";

export const POST = door("POST /orgs/{org}/tasks/{taskId}/practice-runs", ({ actor, params, body }) => logPracticeRun(actor, params.taskId, body));
