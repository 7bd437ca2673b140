import { allow, deny, type Decision } from "@/lib/core/decision";
import type { Actor } from "@/lib/core/roles";

/** Recordings are a workshop's raw material: plates and papers may still be in the picture, so nobody but its mentors sees them. */
export function canWorkOnRecordings(actor: Actor): Decision {
  return actor.roles.has("mentor") ? allow : deny("Only a mentor of this workshop works on its recordings.");
}

/** Who sends what: mentors add recordings, apprentices the evidence of their own practice. */
export function canStartUpload(actor: Actor, purpose: "recording" | "evidence"): Decision {
  if (purpose === "recording") return canWorkOnRecordings(actor);
  return actor.roles.has("apprentice") ? allow : deny("Evidence is added by the apprentice whose practice it shows.");
}
