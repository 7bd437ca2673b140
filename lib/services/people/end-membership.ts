import { getDb } from "@/db/client";
import { endMembershipRow, lockMembership } from "@/db/queries/memberships";
import { assertAllowed } from "@/lib/core/decision";
import { AppError } from "@/lib/core/errors";
import type { Actor } from "@/lib/core/roles";
import { canManagePeople } from "@/lib/policies/people";
import { assertManagerRemains } from "@/lib/services/people/assert-manager-remains";

/**
 * Ends somebody's membership, one's own too. Works at their next request. What they did and what was signed stays; the person stays and
 * can be invited again.
 * @throws AppError("forbidden" | "not_found" | "conflict" for the last manager)
 */
export async function endMembership(actor: Actor, personId: string): Promise<{ personId: string }> {
  assertAllowed(canManagePeople(actor));
  const organisationId = actor.organisation.id;
  return getDb().transaction(async (trx) => {
    await assertManagerRemains(trx, organisationId, personId);
    const membership = await lockMembership(trx, organisationId, personId);
    if (!membership) throw new AppError("not_found", "That person does not belong here.");
    await endMembershipRow(trx, membership.id);
    return { personId };
  });
}
