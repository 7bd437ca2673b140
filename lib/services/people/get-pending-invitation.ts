import type { Knex } from "knex";
import { lockInvitation, type Invitation } from "@/db/queries/invitations";
import { AppError } from "@/lib/core/errors";

/**
 * Locks an invitation that can still be withdrawn or sent again: open, or past its date.
 * @throws AppError("not_found" | "conflict" when it was accepted or withdrawn meanwhile)
 */
export async function getPendingInvitation(trx: Knex.Transaction, organisationId: string, id: string): Promise<Invitation> {
  const invitation = await lockInvitation(trx, organisationId, id);
  if (!invitation) throw new AppError("not_found", "There is no such invitation.");
  if (invitation.state === "accepted") throw new AppError("conflict", `${invitation.name} has accepted meanwhile.`);
  if (invitation.state === "withdrawn") throw new AppError("conflict", "This invitation was withdrawn meanwhile.");
  return invitation;
}
