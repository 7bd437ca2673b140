import { door } from "@/lib/http/door";
import { publishModule } from "@/lib/services/modules/publish-module";

export const POST = door("POST /orgs/{org}/modules/{moduleId}/revisions", ({ actor, params, body }) =>
  publishModule(actor, params.moduleId, body),
);
