import { door } from "@/lib/http/door";
import { saveMarking } from "@/lib/services/marking/save-marking";
import { viewMarking } from "@/lib/services/marking/view-marking";

export const GET = door("GET /orgs/{org}/recordings/{recordingId}/marking", ({ actor, params }) => viewMarking(actor, params.recordingId));
export const PUT = door("PUT /orgs/{org}/recordings/{recordingId}/marking", ({ actor, params, body }) => saveMarking(actor, params.recordingId, body));
