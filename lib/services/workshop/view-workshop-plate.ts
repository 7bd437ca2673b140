import { getDb } from "@/db/client";
import { listTrainees } from "@/db/queries/agreements";
import { assertAllowed } from "@/lib/core/decision";
import type { Actor } from "@/lib/core/roles";
import { canReadWorkshopPlate } from "@/lib/policies/cohorts";
import { viewPlate, type Plate } from "@/lib/services/cohorts/view-plate";

/** Everybody who trains at this workshop, on every task that it uses. @throws AppError("forbidden") */
export async function viewWorkshopPlate(actor: Actor): Promise<Plate> {
  assertAllowed(canReadWorkshopPlate(actor));
  const db = getDb();
  const trainees = (await listTrainees(db, actor.organisation.id)).filter((trainee) => trainee.workshopId === actor.organisation.id);
  const people = trainees.map(({ personId, name, collegeName, startsOn, plannedEndOn }) => ({ personId, name, workshop: collegeName, startsOn, plannedEndOn }));
  return viewPlate(db, actor.organisation.id, people);
}
