import { door } from "@/lib/http/door";
import { lookAtInvitation } from "@/lib/services/accounts/look-at-invitation";

export const POST = door("POST /invitations/look", ({ actor, body }) => lookAtInvitation(actor, body.token));
