import { getDb } from "@/db/client";
import { listPendingInvitations } from "@/db/queries/invitations";
import { listMembers } from "@/db/reads/people";
import { formatDay } from "@/lib/core/dates";
import { assertAllowed } from "@/lib/core/decision";
import { ROLES, roleLabel, ROLES_OF_KIND, type Actor, type Role } from "@/lib/core/roles";
import { canManagePeople } from "@/lib/policies/people";
import { today } from "@/lib/services/clock";

export type PeopleView = {
  /** What somebody can be at this kind of organisation, with the name for it here. */
  roles: { role: Role; label: string }[];
  members: { personId: string; name: string; email: string; roles: Role[]; joinedOn: string; suspended: boolean; you: boolean }[];
  /** Neither accepted nor withdrawn. `until` is the last day of the link, as people read it. */
  invitations: { id: string; name: string; email: string; roles: Role[]; until: string; expired: boolean }[];
};

/**
 * Who belongs to the organisation and who is asked to.
 * @throws AppError("forbidden")
 */
export async function viewPeople(actor: Actor): Promise<PeopleView> {
  assertAllowed(canManagePeople(actor));
  const { id, kind } = actor.organisation;
  const [members, invitations] = await Promise.all([listMembers(getDb(), id), listPendingInvitations(getDb(), id)]);
  return {
    roles: ROLES_OF_KIND[kind].map((role) => ({ role, label: roleLabel(role, kind) })),
    members: members.map(({ joinedAt, ...member }) => ({
      ...member,
      roles: ROLES.filter((role) => member.roles.includes(role)),
      joinedOn: today(joinedAt),
      you: member.personId === actor.personId,
    })),
    invitations: invitations.map(({ id: invitationId, name, email, roles, expiresAt, state }) => ({
      id: invitationId,
      name,
      email,
      roles,
      until: formatDay(today(expiresAt)),
      expired: state === "expired",
    })),
  };
}
