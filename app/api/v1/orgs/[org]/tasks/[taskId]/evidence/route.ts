import { door } from "@/lib/http/door";
import { addEvidence } from "@/lib/services/practice/add-evidence";

export const POST = door("POST /orgs/{org}/tasks/{taskId}/evidence", ({ actor, params, body }) => addEvidence(actor, params.taskId, body));
