import { allow, deny, type Decision } from "@/lib/core/decision";
import type { Actor } from "@/lib/core/roles";

/** Any mentor of the workshop drafts and publishes: a module is the workshop's, not one person's. */
export function canWriteModules(actor: Actor): Decision {
  return actor.roles.has("mentor") ? allow : deny("Only a mentor of this workshop writes and publishes its modules.");
}

/** Only apprentices who train here today, so that nobody gets mail from a workshop that they have left. */
export function canGiveModuleTo(actor: Actor, apprentice: { trainsHereToday: boolean; name: string }): Decision {
  if (!actor.roles.has("mentor")) return deny("Only a mentor gives modules to apprentices.");
  return apprentice.trainsHereToday ? allow : deny(`${apprentice.name} has no training agreement with this workshop today.`);
}
