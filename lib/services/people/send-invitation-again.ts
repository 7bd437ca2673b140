import { getDb } from "@/db/client";
import { renewInvitation } from "@/db/queries/invitations";
import { countHit } from "@/db/queries/rate-limits";
import { assertAllowed } from "@/lib/core/decision";
import { AppError } from "@/lib/core/errors";
import type { Actor } from "@/lib/core/roles";
import { canManagePeople } from "@/lib/policies/people";
import { newToken } from "@/lib/services/accounts/single-use-link";
import { getPendingInvitation } from "@/lib/services/people/get-pending-invitation";
import { INVITATION_DAYS, INVITATION_LETTERS, sendInvitation } from "@/lib/services/people/send-invitation";

/**
 * Sends an invitation again with a new link that holds seven days from now; the old link stops working.
 * @throws AppError("forbidden" | "not_found" | "conflict" | "too_many")
 */
export async function sendInvitationAgain(actor: Actor, invitationId: string): Promise<{ invitationId: string }> {
  assertAllowed(canManagePeople(actor));
  if (!(await countHit(getDb(), `invite:${actor.organisation.id}`, INVITATION_LETTERS))) {
    throw new AppError("too_many", "A hundred invitations were sent within the hour. Go on in the next one.");
  }
  return getDb().transaction(async (trx) => {
    const invitation = await getPendingInvitation(trx, actor.organisation.id, invitationId);
    const { token, tokenHash } = newToken();
    await renewInvitation(trx, invitation.id, { tokenHash, days: INVITATION_DAYS });
    await sendInvitation(trx, actor, { ...invitation, token });
    return { invitationId };
  });
}
