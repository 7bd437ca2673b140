import { door } from "@/lib/http/door";
import { startUpload } from "@/lib/services/uploads/start-upload";
import { viewOpenUploads } from "@/lib/services/uploads/view-open-uploads";

export const POST = door("POST /orgs/{org}/uploads", ({ actor, body }) => startUpload(actor, body));
export const GET = door("GET /orgs/{org}/uploads", async ({ actor }) => ({ uploads: await viewOpenUploads(actor) }));
