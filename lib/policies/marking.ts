import { allow, deny, type Decision } from "@/lib/core/decision";
import type { Actor } from "@/lib/core/roles";

/** Any mentor of the workshop marks out its recordings. */
export function canMarkOut(actor: Actor): Decision {
  return actor.roles.has("mentor") ? allow : deny("Recordings are marked out by a mentor of the workshop.");
}
