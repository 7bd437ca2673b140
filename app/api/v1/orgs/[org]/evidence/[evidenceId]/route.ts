import { door } from "@/lib/http/door";
import { removeEvidence } from "@/lib/services/practice/remove-evidence";

export const DELETE = door("DELETE /orgs/{org}/evidence/{evidenceId}", ({ actor, params }) => removeEvidence(actor, params.evidenceId));
