import { allow, deny, type Decision } from "@/lib/core/decision";
import type { Actor } from "@/lib/core/roles";

/** Practice, evidence and "ready" are one's own, at the workshop where one trains today. */
export function canPractise(actor: Actor, of: { trainsHereToday: boolean }): Decision {
  if (!actor.roles.has("apprentice")) return deny("Practice is logged by apprentices.");
  return of.trainsHereToday ? allow : deny("You have no training agreement with this workshop today.");
}

/** A mentor of the same workshop witnesses a run; nobody witnesses their own. */
export function canConfirmRun(actor: Actor, run: { apprenticeId: string }): Decision {
  if (!actor.roles.has("mentor")) return deny("Practice runs are confirmed by a mentor.");
  return run.apprenticeId === actor.personId ? deny("Nobody confirms their own practice.") : allow;
}
