import { door } from "@/lib/http/door";
import { changeRoles } from "@/lib/services/people/change-roles";

export const PUT = door("PUT /orgs/{org}/people/{personId}/roles", ({ actor, params, body }) =>
  changeRoles(actor, params.personId, body.roles),
);
