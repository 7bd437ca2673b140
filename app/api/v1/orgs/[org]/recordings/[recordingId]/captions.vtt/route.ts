import { door } from "@/lib/http/door";
import { vttFile } from "@/lib/http/vtt";
import { viewCaptionsTrack } from "@/lib/services/marking/view-tracks";

export const GET = door("GET /orgs/{org}/recordings/{recordingId}/captions.vtt", async ({ actor, params }) =>
  vttFile(await viewCaptionsTrack(actor, params.recordingId), "captions.vtt"),
);
