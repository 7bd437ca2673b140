import { getDb } from "@/db/client";
import { lockMembership, setMembershipRoles } from "@/db/queries/memberships";
import { assertAllowed } from "@/lib/core/decision";
import { AppError } from "@/lib/core/errors";
import type { Actor, Role } from "@/lib/core/roles";
import { canManagePeople } from "@/lib/policies/people";
import { assertManagerRemains } from "@/lib/services/people/assert-manager-remains";
import { assertRolesFit } from "@/lib/services/people/assert-roles-fit";

/**
 * Says what somebody is at this organisation; counts from their next request.
 * @throws AppError("forbidden" | "not_found" | "invalid_input" | "conflict" for the last manager)
 */
export async function changeRoles(actor: Actor, personId: string, roles: Role[]): Promise<{ roles: Role[] }> {
  assertAllowed(canManagePeople(actor));
  const { id: organisationId, kind } = actor.organisation;
  assertRolesFit(roles, kind);
  return getDb().transaction(async (trx) => {
    // The managers are locked before the one membership, here and where a membership ends, so that two of them never wait for each other.
    if (!roles.includes("manager")) await assertManagerRemains(trx, organisationId, personId);
    const membership = await lockMembership(trx, organisationId, personId);
    if (!membership) throw new AppError("not_found", "That person does not belong here.");
    await setMembershipRoles(trx, membership.id, roles);
    return { roles };
  });
}
