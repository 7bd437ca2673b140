import { door } from "@/lib/http/door";
import { sendInvitationAgain } from "@/lib/services/people/send-invitation-again";

export const POST = door("POST /orgs/{org}/invitations/{invitationId}/letters", ({ actor, params }) =>
  sendInvitationAgain(actor, params.invitationId),
);
