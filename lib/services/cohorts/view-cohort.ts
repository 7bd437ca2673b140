import { getDb } from "@/db/client";
import { findCohort, listCohortMembers, listCohorts, type CohortListItem } from "@/db/reads/cohorts";
import { assertAllowed } from "@/lib/core/decision";
import { AppError } from "@/lib/core/errors";
import type { Actor } from "@/lib/core/roles";
import { canReadCohorts } from "@/lib/policies/cohorts";
import { viewPlate, type Plate } from "@/lib/services/cohorts/view-plate";

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
