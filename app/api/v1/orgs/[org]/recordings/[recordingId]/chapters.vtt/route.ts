import { door } from "@/lib/http/door";
import { vttFile } from "@/lib/http/vtt";
import { viewChaptersTrack } from "@/lib/services/marking/view-tracks";

export const GET = door("GET /orgs/{org}/recordings/{recordingId}/chapters.vtt", async ({ actor, params }) =>
  vttFile(await viewChaptersTrack(actor, params.recordingId), "steps.vtt"),
);
