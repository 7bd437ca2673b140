import { door } from "@/lib/http/door";
import { acceptInvitation } from "@/lib/services/accounts/accept-invitation";

export const POST = door("POST /invitations/accept", ({ actor, body }) => acceptInvitation(actor, body));
