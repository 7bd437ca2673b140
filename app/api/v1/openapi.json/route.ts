import { door } from "@/lib/http/door";
import { openApiDocument } from "@/lib/schemas/contract/openapi";

export const GET = door("GET /openapi.json", async ({ request }) => Response.json(openApiDocument(new URL(request.url).origin)));
