import { door } from "@/lib/http/door";
import { viewRecordings } from "@/lib/services/recordings/view-recordings";

export const GET = door("GET /orgs/{org}/recordings", async ({ actor }) => ({ recordings: await viewRecordings(actor) }));
