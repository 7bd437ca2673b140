import type { Knex } from "knex";
import type { Db } from "@/db/client";
import type { Actor, OrganisationKind, Role, SignedIn } from "@/lib/core/roles";

export type PersonWithSecret = { id: string; name: string; email: string; passwordHash: string | null; suspendedAt: Date | null };

/** @param email lower case. */
export async function findPersonByEmail(db: Db, email: string): Promise<PersonWithSecret | undefined> {
  return findPersonWithSecret(db, { email });
}

/** For asking the password again before something is signed. */
export async function findPersonWithSecret(db: Db, by: { id: string } | { email: string }): Promise<PersonWithSecret | undefined> {
  const row = await db("people").select("id", "name", "email", "password_hash", "suspended_at").where(by).first();
  return row && { id: row.id, name: row.name, email: row.email, passwordHash: row.password_hash, suspendedAt: row.suspended_at };
}

/** The person of a session that still holds: not ended, not expired, the person not suspended. Notes that they were here, once a minute. */
export async function findSessionPerson(db: Db, sessionId: string): Promise<SignedIn | undefined> {
  const row = await db("sessions as s")
    .join("people as p", "p.id", "s.person_id")
    .select("p.id", "p.name", "p.email", "s.last_seen_at")
    .where("s.id", sessionId)
    .whereNull("s.ended_at")
    .where("s.expires_at", ">", db.fn.now())
    .whereNull("p.suspended_at")
    .first();
  if (!row) return undefined;
  if (Date.now() - row.last_seen_at.getTime() > 60_000) {
    await db("sessions").where({ id: sessionId }).update({ last_seen_at: db.fn.now() });
  }
  return { personId: row.id, name: row.name, email: row.email, sessionId };
}

type ActorRow = Pick<Actor, "organisation" | "roles">;
type MembershipRow = { id: string; slug: string; name: string; kind: OrganisationKind; is_demo: boolean; roles: Role[] };

const membershipsOf = (db: Db, personId: string) =>
  db("memberships as m")
    .join("organisations as o", "o.id", "m.organisation_id")
    .select<MembershipRow[]>("o.id", "o.slug", "o.name", "o.kind", "o.is_demo", "m.roles")
    .where("m.person_id", personId)
    .whereNull("m.ended_at");

const toActorRow = ({ roles, is_demo: isDemo, ...organisation }: MembershipRow): ActorRow => ({
  organisation: { ...organisation, isDemo },
  roles: new Set(roles),
});

/** Roles that the person has now at one organisation. */
export async function findActorRow(db: Db, personId: string, slug: string): Promise<ActorRow | undefined> {
  const row = await membershipsOf(db, personId).where("o.slug", slug).first();
  return row && toActorRow(row);
}

/** Every organisation that the person belongs to now, by name. */
export async function listActorRows(db: Db, personId: string): Promise<ActorRow[]> {
  return (await membershipsOf(db, personId).orderBy("o.name")).map(toActorRow);
}

/** Makes a person; undefined where the address has one already. */
export async function insertPerson(
  trx: Knex.Transaction,
  of: { name: string; email: string; passwordHash: string; dateOfBirth: string | null },
): Promise<string | undefined> {
  const [row] = await trx("people")
    .insert({ name: of.name, email: of.email, password_hash: of.passwordHash, date_of_birth: of.dateOfBirth })
    .onConflict("email")
    .ignore()
    .returning<{ id: string }[]>("id");
  return row?.id;
}

export async function setPasswordHash(trx: Knex.Transaction, personId: string, passwordHash: string): Promise<void> {
  await trx("people").where({ id: personId }).update({ password_hash: passwordHash });
}

/** Suspends a person from the whole installation, or lets them back in. Returns whether there is such a person. */
export async function setSuspended(db: Db, email: string, suspended: boolean): Promise<boolean> {
  const changed = await db("people").where({ email }).update({ suspended_at: suspended ? db.fn.now() : null });
  return changed > 0;
}
