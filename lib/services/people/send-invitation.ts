import type { Knex } from "knex";
import { invitationLetter } from "@/lib/core/letters/invitation";
import { formatDay } from "@/lib/core/dates";
import { roleLabel, type Actor, type Role } from "@/lib/core/roles";
import { postLetter } from "@/lib/jobs/post-letter";
import { linkTo } from "@/lib/services/accounts/single-use-link";
import { today } from "@/lib/services/clock";

/** How long an invitation's link holds. */
export const INVITATION_DAYS = 7;
/** Letters an hour that one organisation may cause, so that nobody makes a nuisance of it. */
export const INVITATION_LETTERS = { limit: 100, windowSeconds: 3600 };

/** Posts the letter with an invitation's link, in the transaction that wrote the invitation. */
export async function sendInvitation(
  trx: Knex.Transaction,
  actor: Actor,
  to: { name: string; email: string; roles: readonly Role[]; token: string },
): Promise<void> {
  const lastDay = today(new Date(Date.now() + INVITATION_DAYS * 24 * 3600 * 1000));
  await postLetter(
    trx,
    invitationLetter({
      to: to.email,
      name: to.name,
      organisation: actor.organisation.name,
      roles: to.roles.map((role) => roleLabel(role, actor.organisation.kind)).join(" and "),
      invitedBy: actor.name,
      address: linkTo("/join", to.token),
      until: formatDay(lastDay),
    }),
  );
}
