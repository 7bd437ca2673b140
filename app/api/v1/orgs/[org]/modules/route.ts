import { door } from "@/lib/http/door";
import { createModule } from "@/lib/services/modules/create-module";

export const POST = door("POST /orgs/{org}/modules", ({ actor, body }) => createModule(actor, body));
