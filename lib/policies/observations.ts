import { allow, deny, type Decision } from "@/lib/core/decision";
import type { Actor } from "@/lib/core/roles";

type Performance = { apprenticeId: string; sharesRecord: boolean; independence: boolean; workshopId: string };

/** An assessor observes apprentices whose record their organisation shares, never themselves, and from outside where the task asks for it. */
export function canObserve(actor: Actor, of: Performance): Decision {
  if (!actor.roles.has("assessor")) return deny("Only an assessor fills in observation sheets.");
  if (of.apprenticeId === actor.personId) return deny("Nobody observes their own work. Ask another assessor.");
  if (!of.sharesRecord) return deny("Your organisation has no training agreement for this apprentice today.");
  if (of.independence && actor.organisation.id === of.workshopId) {
    return deny("This task asks for an assessor who doesn't work at the apprentice's workshop.");
  }
  return allow;
}

/** A sheet belongs to the assessor who opened it. */
export function canFillSheet(actor: Actor, sheet: { assessorId: string; apprenticeId: string }): Decision {
  if (!actor.roles.has("assessor")) return deny("Only an assessor fills in observation sheets.");
  if (sheet.apprenticeId === actor.personId) return deny("Nobody signs off their own work.");
  if (sheet.assessorId !== actor.personId) return deny("This sheet was opened by another assessor. Only they can fill it in and sign it.");
  return allow;
}

/** Withdrawn by who signed it, or by a verifier of the same organisation; never by the person it is about. */
export function canWithdrawSignOff(actor: Actor, signOff: { assessorId: string; apprenticeId: string }): Decision {
  if (signOff.apprenticeId === actor.personId) return deny("Nobody changes their own sign-offs.");
  if (actor.roles.has("verifier")) return allow;
  if (actor.roles.has("assessor") && signOff.assessorId === actor.personId) return allow;
  return deny("Only the assessor who signed it, or a verifier, can withdraw a sign-off.");
}

/** Who may read a sign-off: the organisation that signed, the apprentice, and the workshop and college that share the record. */
export function canReadSignOff(
  actor: Actor,
  signOff: { organisationId: string; apprenticeId: string; workshopId: string; sharesRecord: boolean },
): Decision {
  if (signOff.apprenticeId === actor.personId) return allow;
  const staff = (["assessor", "verifier", "manager", "liaison", "mentor"] as const).some((role) => actor.roles.has(role));
  const ours = signOff.organisationId === actor.organisation.id || signOff.workshopId === actor.organisation.id || signOff.sharesRecord;
  return staff && ours ? allow : deny("This sign-off belongs to another record.");
}
