import type { Knex } from "knex";
import type { Role } from "@/lib/core/roles";

export type Membership = { id: string; personId: string; roles: Role[] };

type MembershipRow = { id: string; person_id: string; roles: Role[] };

const openMemberships = (trx: Knex.Transaction, organisationId: string) =>
  trx("memberships").select<MembershipRow[]>("id", "person_id", "roles").where({ organisation_id: organisationId }).whereNull("ended_at");

const toMembership = (row: MembershipRow): Membership => ({ id: row.id, personId: row.person_id, roles: row.roles });

/** Locks one person's membership, as it stands today. */
export async function lockMembership(
  trx: Knex.Transaction,
  organisationId: string,
  personId: string,
): Promise<Membership | undefined> {
  const row = await openMemberships(trx, organisationId).where({ person_id: personId }).forUpdate().first();
  return row && toMembership(row);
}

/** Locks every manager of the organisation, always in the same order, so that two of them can't end each other at once. */
export async function lockManagers(trx: Knex.Transaction, organisationId: string): Promise<Membership[]> {
  const rows = await openMemberships(trx, organisationId).whereRaw("'manager' = ANY(roles)").orderBy("id").forUpdate();
  return rows.map(toMembership);
}

/** Begins a membership. @throws a unique violation where the person belongs here already */
export async function insertMembership(
  trx: Knex.Transaction,
  of: { organisationId: string; personId: string; roles: Role[] },
): Promise<void> {
  await trx("memberships").insert({ organisation_id: of.organisationId, person_id: of.personId, roles: of.roles });
}

export async function setMembershipRoles(trx: Knex.Transaction, id: string, roles: Role[]): Promise<void> {
  await trx("memberships").where({ id }).update({ roles });
}

/** Ends a membership; works at once, since roles are read on every request. The row stays: who belonged here, and when. */
export async function endMembershipRow(trx: Knex.Transaction, id: string): Promise<void> {
  await trx("memberships").where({ id }).update({ ended_at: trx.raw("greatest(now(), joined_at)") });
}
