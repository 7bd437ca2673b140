import { door } from "@/lib/http/door";
import { withdrawInvitation } from "@/lib/services/people/withdraw-invitation";

export const DELETE = door("DELETE /orgs/{org}/invitations/{invitationId}", ({ actor, params }) =>
  withdrawInvitation(actor, params.invitationId),
);
