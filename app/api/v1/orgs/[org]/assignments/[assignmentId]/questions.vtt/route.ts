import { door } from "@/lib/http/door";
import { viewQuestionTrack } from "@/lib/services/learning/view-question-track";

export const GET = door("GET /orgs/{org}/assignments/{assignmentId}/questions.vtt", async ({ actor, params, query }) => {
  const vtt = await viewQuestionTrack(actor, params.assignmentId, query.recordingId);
  return new Response(vtt, { headers: { "content-type": "text/vtt; charset=utf-8", "cache-control": "no-store" } });
});
