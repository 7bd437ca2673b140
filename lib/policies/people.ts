import { allow, deny, type Decision } from "@/lib/core/decision";
import type { Actor } from "@/lib/core/roles";

/** Who belongs to an organisation, who is invited and what they are there is the manager's to say, at a workshop and a college alike. */
export function canManagePeople(actor: Actor): Decision {
  return actor.roles.has("manager") ? allow : deny(`Only a manager of ${actor.organisation.name} says who belongs to it.`);
}
