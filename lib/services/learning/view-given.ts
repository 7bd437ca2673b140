import { getDb } from "@/db/client";
import { listGivenModules, type GivenModule } from "@/db/reads/learning";
import { AppError } from "@/lib/core/errors";
import type { Actor } from "@/lib/core/roles";

/** The modules that this apprentice was given here. @throws AppError("forbidden") */
export async function viewGiven(actor: Actor): Promise<GivenModule[]> {
  if (!actor.roles.has("apprentice")) throw new AppError("forbidden", "Modules are given to apprentices.");
  return listGivenModules(getDb(), actor.organisation.id, actor.personId);
}
