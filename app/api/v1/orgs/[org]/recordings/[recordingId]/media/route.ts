import { door } from "@/lib/http/door";
import { viewRecordingMedia } from "@/lib/services/recordings/view-recording-media";

export const GET = door("GET /orgs/{org}/recordings/{recordingId}/media", ({ actor, params }) => viewRecordingMedia(actor, params.recordingId));
