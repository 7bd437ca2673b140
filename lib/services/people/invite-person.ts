import { getDb } from "@/db/client";
import { insertInvitation, listPendingInvitations, lockInvitedAddress } from "@/db/queries/invitations";
import { lockMembership } from "@/db/queries/memberships";
import { findPersonByEmail } from "@/db/queries/people";
import { countHit } from "@/db/queries/rate-limits";
import { assertAllowed } from "@/lib/core/decision";
import { AppError } from "@/lib/core/errors";
import type { Actor } from "@/lib/core/roles";
import { canManagePeople } from "@/lib/policies/people";
import type { InvitePersonInput } from "@/lib/schemas/people";
import { newToken } from "@/lib/services/accounts/single-use-link";
import { assertRolesFit } from "@/lib/services/people/assert-roles-fit";
import { INVITATION_DAYS, INVITATION_LETTERS, sendInvitation } from "@/lib/services/people/send-invitation";

/**
 * Invites somebody by mail. Says nothing about whether the address is known to the installation, only whether it belongs here already.
 * @throws AppError("forbidden" | "invalid_input" for a role this kind of organisation hasn't | "conflict" | "too_many")
 */
export async function invitePerson(actor: Actor, input: InvitePersonInput): Promise<{ invitationId: string }> {
  assertAllowed(canManagePeople(actor));
  const { organisation } = actor;
  assertRolesFit(input.roles, organisation.kind);
  if (!(await countHit(getDb(), `invite:${organisation.id}`, INVITATION_LETTERS))) {
    throw new AppError("too_many", "A hundred invitations were sent within the hour. Go on in the next one.");
  }
  return getDb().transaction(async (trx) => {
    await lockInvitedAddress(trx, organisation.id, input.email);
    const person = await findPersonByEmail(trx, input.email);
    if (person && (await lockMembership(trx, organisation.id, person.id))) {
      throw new AppError("conflict", `${person.name} belongs here already. Change what they do in the table.`);
    }
    const waiting = (await listPendingInvitations(trx, organisation.id)).some(({ email }) => email === input.email);
    if (waiting) throw new AppError("conflict", "That address is invited already. Send the invitation again, or withdraw it first.");
    const { token, tokenHash } = newToken();
    const invitationId = await insertInvitation(trx, {
      ...input,
      organisationId: organisation.id,
      tokenHash,
      invitedBy: actor.personId,
      days: INVITATION_DAYS,
    });
    await sendInvitation(trx, actor, { ...input, token });
    return { invitationId };
  });
}
