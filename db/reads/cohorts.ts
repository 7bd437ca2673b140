import type { Db } from "@/db/client";

export type CohortListItem = { id: string; name: string; startsOn: string; members: number };

export async function listCohorts(db: Db, organisationId: string): Promise<CohortListItem[]> {
  const rows = await db("cohorts as c")
    .leftJoin("cohort_members as m", "m.cohort_id", "c.id")
    .select("c.id", "c.name", "c.starts_on")
    .count("m.agreement_id as members")
    .where("c.organisation_id", organisationId)
    .groupBy("c.id")
    .orderBy("c.starts_on", "desc");
  return (rows as unknown as { id: string; name: string; starts_on: string; members: number }[]).map((row) => ({
    id: row.id,
    name: row.name,
    startsOn: row.starts_on,
    members: row.members,
  }));
}

export async function findCohort(db: Db, organisationId: string, id: string): Promise<{ id: string; name: string } | undefined> {
  return db("cohorts").select("id", "name").where({ organisation_id: organisationId, id }).first();
}

export type CohortMember = { personId: string; name: string; workshop: string; startsOn: string; plannedEndOn: string };

/** Apprentices of one cohort, or of every cohort, by name. A person who changed workshop has one agreement in a cohort: the present one. */
export async function listCohortMembers(db: Db, organisationId: string, cohortId?: string): Promise<(CohortMember & { cohortId: string })[]> {
  const rows = await db("cohort_members as m")
    .join("training_agreements as a", "a.id", "m.agreement_id")
    .join("people as p", "p.id", "a.apprentice_id")
    .join("organisations as w", "w.id", "a.workshop_id")
    .select("m.cohort_id", "p.id", "p.name", "w.name as workshop", "a.starts_on", "a.planned_end_on")
    .where({ "m.organisation_id": organisationId, ...(cohortId === undefined ? {} : { "m.cohort_id": cohortId }) })
    .orderBy("p.name");
  return rows.map((row) => ({
    cohortId: row.cohort_id,
    personId: row.id,
    name: row.name,
    workshop: row.workshop,
    startsOn: row.starts_on,
    plannedEndOn: row.planned_end_on,
  }));
}
