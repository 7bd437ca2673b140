import { door } from "@/lib/http/door";
import { vttFile } from "@/lib/http/vtt";
import { viewMarkingTrack } from "@/lib/services/marking/view-tracks";

export const GET = door("GET /orgs/{org}/recordings/{recordingId}/questions.vtt", async ({ actor, params }) =>
  vttFile(await viewMarkingTrack(actor, params.recordingId), "facts-and-questions.vtt"),
);
