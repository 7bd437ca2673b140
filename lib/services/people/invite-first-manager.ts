import { getDb } from "@/db/client";
import { insertInvitation } from "@/db/queries/invitations";
import { insertOrganisation } from "@/db/queries/organisations";
import { AppError } from "@/lib/core/errors";
import type { OrganisationKind } from "@/lib/core/roles";
import { linkTo, newToken } from "@/lib/services/accounts/single-use-link";
import { INVITATION_DAYS } from "@/lib/services/people/send-invitation";

/**
 * Founds an organisation and invites its first manager, with nobody as the inviter: for the installation's keeper, who runs it as a
 * command and hands the link over. Who can run commands on the server could write the rows anyway.
 * @returns the single-use link; it is shown this once and stored nowhere
 * @throws AppError("conflict" when the short name is taken)
 */
export async function inviteFirstManager(of: {
  organisation: string;
  kind: OrganisationKind;
  slug: string;
  name: string;
  email: string;
}): Promise<{ link: string; days: number }> {
  return getDb().transaction(async (trx) => {
    const organisation = await insertOrganisation(trx, { name: of.organisation, kind: of.kind, slug: of.slug });
    if (!organisation) throw new AppError("conflict", `The short name “${of.slug}” is taken. Choose another one.`);
    const { token, tokenHash } = newToken();
    await insertInvitation(trx, {
      organisationId: organisation.id,
      name: of.name,
      email: of.email,
      roles: ["manager"],
      tokenHash,
      invitedBy: null,
      days: INVITATION_DAYS,
    });
    return { link: linkTo("/join", token), days: INVITATION_DAYS };
  });
}
