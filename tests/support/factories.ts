import { randomBytes } from "node:crypto";
import type { Db } from "@/db/client";
import { getDb } from "@/db/client";
import type { Actor, OrganisationKind, Role } from "@/lib/core/roles";

/** The least valid row of each kind; what a test cares about is given as an override. Rows go through the application's own role. */
const unique = () => randomBytes(4).toString("hex");

async function insert<Row extends { id: string }>(table: string, row: object, db: Db = getDb()): Promise<Row> {
  const [made] = await db(table).insert(row).returning("*");
  return made as Row;
}

export type Organisation = Actor["organisation"];

export async function createOrganisation(kind: OrganisationKind = "workshop", over: { name?: string } = {}): Promise<Organisation> {
  const tag = unique();
  const row = await insert<{ id: string; slug: string; name: string }>("organisations", {
    slug: `${kind}-${tag}`,
    name: over.name ?? `Test ${kind} ${tag}`,
    kind,
  });
  return { id: row.id, slug: row.slug, name: row.name, kind, isDemo: false };
}

/** A person with a membership and an Actor to hand to services. Several roles may be given. */
export async function createMember(
  organisation: Organisation,
  roles: Role | Role[],
  over: { name?: string; email?: string; dateOfBirth?: string; passwordHash?: string } = {},
): Promise<Actor> {
  const tag = unique();
  const list = Array.isArray(roles) ? roles : [roles];
  const person = await insert<{ id: string; name: string; email: string }>("people", {
    name: over.name ?? `Test ${list[0]} ${tag}`,
    email: over.email ?? `${list[0]}-${tag}@people.test`,
    date_of_birth: over.dateOfBirth ?? "2000-01-01",
    password_hash: over.passwordHash ?? null,
  });
  await insert("memberships", { organisation_id: organisation.id, person_id: person.id, roles: list });
  return { personId: person.id, name: person.name, email: person.email, sessionId: "", organisation, roles: new Set(list) };
}

/** Shares an apprentice's record between a workshop and a college. */
export async function createAgreement(of: {
  apprentice: Actor;
  workshop: Organisation;
  college: Organisation;
  startsOn?: string;
  endsOn?: string | null;
}): Promise<{ id: string }> {
  return insert("training_agreements", {
    apprentice_id: of.apprentice.personId,
    workshop_id: of.workshop.id,
    college_id: of.college.id,
    qualification: "Light vehicle technician",
    starts_on: of.startsOn ?? "2024-01-01",
    planned_end_on: "2030-01-01",
    ends_on: of.endsOn ?? null,
    contracted_minutes: 0,
  });
}
