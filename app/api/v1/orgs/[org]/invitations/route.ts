import { door } from "@/lib/http/door";
import { invitePerson } from "@/lib/services/people/invite-person";

export const POST = door("POST /orgs/{org}/invitations", ({ actor, body }) => invitePerson(actor, body));
