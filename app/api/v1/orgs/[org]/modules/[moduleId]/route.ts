import { door } from "@/lib/http/door";
import { saveModule } from "@/lib/services/modules/save-module";

export const PUT = door("PUT /orgs/{org}/modules/{moduleId}", ({ actor, params, body }) => saveModule(actor, params.moduleId, body));
