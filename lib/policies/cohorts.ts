import { allow, deny, type Decision } from "@/lib/core/decision";
import type { Actor } from "@/lib/core/roles";

/** Cohorts are the college liaison's. */
export function canReadCohorts(actor: Actor): Decision {
  return actor.roles.has("liaison") ? allow : deny("Cohorts are read by the college liaison.");
}

/** Who stands where on what, across a workshop: its manager and mentors. */
export function canReadWorkshopPlate(actor: Actor): Decision {
  return actor.roles.has("manager") || actor.roles.has("mentor") ? allow : deny("This plate is for the workshop’s manager and mentors.");
}
