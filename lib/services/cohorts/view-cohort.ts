import { getDb } from "@/db/client";
import { findCohort, listCohortMembers, listCohorts, type CohortListItem } from "@/db/reads/cohorts";
import { assertAllowed } from "@/lib/core/decision";
import { AppError } from "@/lib/core/errors";
import type { Actor } from "@/lib/core/roles";
import { canReadCohorts } from "@/lib/policies/cohorts";
import { viewPlate, type Plate, type PlateRow } from "@/lib/services/cohorts/view-plate";

/** @throws AppError("forbidden") */
export async function viewCohorts(actor: Actor): Promise<CohortListItem[]> {
  assertAllowed(canReadCohorts(actor));
  return listCohorts(getDb(), actor.organisation.id);
}

export type CohortView = { id: string; name: string; plate: Plate };

/** A cohort as a plate of bolts. @throws AppError("not_found" | "forbidden") */
export async function viewCohort(actor: Actor, cohortId: string): Promise<CohortView> {
  assertAllowed(canReadCohorts(actor));
  const db = getDb();
  const cohort = await findCohort(db, actor.organisation.id, cohortId);
  if (!cohort) throw new AppError("not_found", "There is no such cohort.");
  const members = await listCohortMembers(db, actor.organisation.id, cohortId);
  return { ...cohort, plate: await viewPlate(db, actor.organisation.id, members) };
}

export type WaitingInCohort = CohortListItem & { waiting: PlateRow[] };

/** Every cohort with its apprentices who wait to be observed, the longest first. As many queries for one cohort as for all. @throws AppError("forbidden") */
export async function viewWaiting(actor: Actor): Promise<WaitingInCohort[]> {
  const cohorts = await viewCohorts(actor);
  const db = getDb();
  const members = await listCohortMembers(db, actor.organisation.id);
  // Somebody may be in two cohorts, but stands once on the plate.
  const people = [...new Map(members.map((member) => [member.personId, member])).values()];
  const rows = new Map((await viewPlate(db, actor.organisation.id, people)).rows.map((row) => [row.personId, row]));
  return cohorts.map((cohort) => ({
    ...cohort,
    waiting: members
      .filter((member) => member.cohortId === cohort.id)
      .flatMap((member) => rows.get(member.personId) ?? [])
      .filter((row) => row.waitedDays !== null)
      .toSorted((a, b) => (b.waitedDays ?? 0) - (a.waitedDays ?? 0)),
  }));
}
