import { getDb } from "@/db/client";
import { findInvitationByToken } from "@/db/queries/invitations";
import { findOrganisation } from "@/db/queries/organisations";
import { findPersonByEmail, findPersonWithSecret } from "@/db/queries/people";
import { AppError } from "@/lib/core/errors";
import { roleLabel, type SignedIn } from "@/lib/core/roles";
import type { InvitationView } from "@/lib/schemas/accounts";
import { invitationGone } from "@/lib/services/accounts/invitation-gone";
import { hashToken } from "@/lib/services/accounts/single-use-link";

/**
 * What the holder of a link is invited to, and what they have to do to accept. Changes nothing, so that a mail filter that opens links
 * does no harm.
 * @throws AppError("gone") when the link was used, withdrawn, expired or replaced
 */
export async function lookAtInvitation(signedIn: SignedIn | null, token: string): Promise<InvitationView> {
  const db = getDb();
  const invitation = await findInvitationByToken(db, hashToken(token));
  if (!invitation) throw invitationGone("unknown");
  if (invitation.state !== "open") throw invitationGone(invitation.state);
  const organisation = await findOrganisation(db, { id: invitation.organisationId });
  if (!organisation) throw new AppError("gone", "That organisation is not here any more.");
  const inviter = invitation.invitedBy === null ? undefined : await findPersonWithSecret(db, { id: invitation.invitedBy });
  return {
    organisation: organisation.name,
    name: invitation.name,
    email: invitation.email,
    roles: invitation.roles,
    roleLabels: invitation.roles.map((role) => roleLabel(role, organisation.kind)),
    invitedBy: inviter?.name ?? null,
    expiresAt: invitation.expiresAt.toISOString(),
    you: await whatIsNeeded(signedIn, invitation.email),
    signedInAs: signedIn?.email ?? null,
  };
}

async function whatIsNeeded(signedIn: SignedIn | null, email: string): Promise<InvitationView["you"]> {
  if (signedIn) return signedIn.email === email ? "ready" : "someone_else";
  return (await findPersonByEmail(getDb(), email)) ? "sign_in" : "new";
}
