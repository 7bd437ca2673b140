import type { Db } from "@/db/client";
import type { Role } from "@/lib/core/roles";

export type Member = { personId: string; name: string; email: string; roles: Role[]; joinedAt: Date; suspended: boolean };

type MemberRow = { person_id: string; name: string; email: string; roles: Role[]; joined_at: Date; suspended_at: Date | null };

/** Everybody who belongs to the organisation now, by name. */
export async function listMembers(db: Db, organisationId: string): Promise<Member[]> {
  const rows = await db("memberships as m")
    .join("people as p", "p.id", "m.person_id")
    .select<MemberRow[]>("m.person_id", "p.name", "p.email", "m.roles", "m.joined_at", "p.suspended_at")
    .where("m.organisation_id", organisationId)
    .whereNull("m.ended_at")
    .orderBy(["p.name", "m.person_id"]);
  return rows.map((row) => ({
    personId: row.person_id,
    name: row.name,
    email: row.email,
    roles: row.roles,
    joinedAt: row.joined_at,
    suspended: row.suspended_at !== null,
  }));
}
