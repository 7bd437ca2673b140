import { door } from "@/lib/http/door";
import { endMembership } from "@/lib/services/people/end-membership";

export const DELETE = door("DELETE /orgs/{org}/people/{personId}", ({ actor, params }) => endMembership(actor, params.personId));
