import { door } from "@/lib/http/door";
import { changeRecording } from "@/lib/services/recordings/change-recording";
import { putAwayRecording } from "@/lib/services/recordings/put-away-recording";
import { viewRecording } from "@/lib/services/recordings/view-recording";

export const GET = door("GET /orgs/{org}/recordings/{recordingId}", ({ actor, params }) => viewRecording(actor, params.recordingId));
export const PATCH = door("PATCH /orgs/{org}/recordings/{recordingId}", ({ actor, params, body }) =>
  changeRecording(actor, params.recordingId, body),
);
export const DELETE = door("DELETE /orgs/{org}/recordings/{recordingId}", ({ actor, params }) => putAwayRecording(actor, params.recordingId));
