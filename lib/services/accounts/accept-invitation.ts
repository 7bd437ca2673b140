import type { Knex } from "knex";
import { getDb } from "@/db/client";
import { lockInvitationByToken, markInvitationAccepted, type Invitation } from "@/db/queries/invitations";
import { insertMembership, lockMembership, setMembershipRoles } from "@/db/queries/memberships";
import { findOrganisation } from "@/db/queries/organisations";
import { findPersonByEmail, insertPerson } from "@/db/queries/people";
import { hashPassword } from "@/lib/auth/passwords";
import { AppError } from "@/lib/core/errors";
import { ROLES, type SignedIn } from "@/lib/core/roles";
import type { AcceptInvitationInput } from "@/lib/schemas/accounts";
import { assertGoodPassword } from "@/lib/services/accounts/assert-good-password";
import { invitationGone } from "@/lib/services/accounts/invitation-gone";
import { hashToken } from "@/lib/services/accounts/single-use-link";

const SIGN_IN_FIRST = new AppError("unauthenticated", "This address has an account already. Sign in with it, then accept.");

/**
 * Accepts an invitation: the one way into an organisation. Somebody new becomes a person with it; who is one already must be signed in.
 * Who belongs there already gets the new roles beside their old ones. Pressed twice, or in two tabs, it makes one membership.
 * @returns where they belong now, and the address to sign in with
 * @throws AppError("gone" | "unauthenticated" | "forbidden" when signed in as somebody else | "invalid_input" for a poor password)
 */
export async function acceptInvitation(signedIn: SignedIn | null, input: AcceptInvitationInput): Promise<{ org: string; email: string }> {
  return getDb().transaction(async (trx) => {
    const invitation = await lockInvitationByToken(trx, hashToken(input.token));
    if (!invitation) throw invitationGone("unknown");
    const organisation = await findOrganisation(trx, { id: invitation.organisationId });
    if (!organisation) throw invitationGone("unknown");
    const answer = { org: organisation.slug, email: invitation.email };
    if (invitation.state === "accepted" && signedIn && invitation.acceptedBy === signedIn.personId) return answer;
    if (invitation.state !== "open") throw invitationGone(invitation.state);

    const personId = signedIn ? existingPerson(signedIn, invitation) : await newPerson(trx, invitation, input.person, organisation.name);
    const membership = await lockMembership(trx, organisation.id, personId);
    if (membership) {
      const roles = ROLES.filter((role) => membership.roles.includes(role) || invitation.roles.includes(role));
      await setMembershipRoles(trx, membership.id, roles);
    } else {
      await insertMembership(trx, { organisationId: organisation.id, personId, roles: invitation.roles });
    }
    await markInvitationAccepted(trx, invitation.id, personId);
    return answer;
  });
}

function existingPerson(signedIn: SignedIn, invitation: Invitation): string {
  if (signedIn.email === invitation.email) return signedIn.personId;
  throw new AppError("forbidden", `This invitation is for ${invitation.email}, and you are signed in as ${signedIn.email}.`);
}

async function newPerson(
  trx: Knex.Transaction,
  { email }: Invitation,
  person: AcceptInvitationInput["person"],
  organisation: string,
): Promise<string> {
  if (await findPersonByEmail(trx, email)) throw SIGN_IN_FIRST;
  if (!person) throw new AppError("invalid_input", "Choose a name and a password first.");
  assertGoodPassword(person.password, [person.name, email, organisation]);
  const { name, dateOfBirth } = person;
  // Undefined where another invitation to the same address was accepted at this very moment.
  const personId = await insertPerson(trx, { name, email, dateOfBirth, passwordHash: await hashPassword(person.password) });
  if (!personId) throw SIGN_IN_FIRST;
  return personId;
}
