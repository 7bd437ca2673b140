import { getDb } from "@/db/client";
import { markInvitationWithdrawn } from "@/db/queries/invitations";
import { assertAllowed } from "@/lib/core/decision";
import type { Actor } from "@/lib/core/roles";
import { canManagePeople } from "@/lib/policies/people";
import { getPendingInvitation } from "@/lib/services/people/get-pending-invitation";

/**
 * Withdraws an invitation; its link says so from now on.
 * @throws AppError("forbidden" | "not_found" | "conflict")
 */
export async function withdrawInvitation(actor: Actor, invitationId: string): Promise<{ invitationId: string }> {
  assertAllowed(canManagePeople(actor));
  return getDb().transaction(async (trx) => {
    const invitation = await getPendingInvitation(trx, actor.organisation.id, invitationId);
    await markInvitationWithdrawn(trx, invitation.id);
    return { invitationId };
  });
}
