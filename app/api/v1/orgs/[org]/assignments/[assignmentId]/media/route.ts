import { door } from "@/lib/http/door";
import { viewMedia } from "@/lib/services/learning/view-media";

export const GET = door("GET /orgs/{org}/assignments/{assignmentId}/media", ({ actor, params }) => viewMedia(actor, params.assignmentId));
