import { door } from "@/lib/http/door";
import { giveModule } from "@/lib/services/modules/give-module";

export const POST = door("POST /orgs/{org}/modules/{moduleId}/assignments", ({ actor, params, body }) =>
  giveModule(actor, params.moduleId, body),
);
