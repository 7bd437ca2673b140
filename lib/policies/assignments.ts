import { allow, deny, type Decision } from "@/lib/core/decision";
import type { Actor } from "@/lib/core/roles";

/** What was given to an apprentice is theirs alone to play and answer: nobody learns for somebody else. */
export function canLearn(actor: Actor, assignment: { apprenticeId: string }): Decision {
  if (!actor.roles.has("apprentice")) return deny("Modules are learned by apprentices.");
  if (assignment.apprenticeId !== actor.personId) return deny("This was given to another apprentice.");
  return allow;
}
