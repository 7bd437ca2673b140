import { getDb } from "@/db/client";
import { countOwnSteps, findModuleForUpdate, replaceModuleSteps, replaceModuleTasks, updateModule } from "@/db/queries/modules";
import { countUsableTasks } from "@/db/queries/tasks";
import { assertAllowed } from "@/lib/core/decision";
import { AppError } from "@/lib/core/errors";
import type { Actor } from "@/lib/core/roles";
import { canWriteModules } from "@/lib/policies/modules";
import type { ModuleDraftInput } from "@/lib/schemas/modules";

/**
 * Saves a module's draft as a whole.
 * @returns the new version
 * @throws AppError("forbidden" | "not_found" | "conflict" when somebody saved in between | "invalid_input" for a step or task of others)
 */
export async function saveModule(actor: Actor, moduleId: string, input: ModuleDraftInput): Promise<{ version: number }> {
  assertAllowed(canWriteModules(actor));
  const organisationId = actor.organisation.id;
  return getDb().transaction(async (trx) => {
    const module = await findModuleForUpdate(trx, organisationId, moduleId);
    if (!module) throw new AppError("not_found", "There is no such module.");
    if (module.version !== input.version) {
      throw new AppError("conflict", "Somebody else saved this module meanwhile. Yours is still on this page; load it again to see theirs.");
    }
    if ((await countOwnSteps(trx, organisationId, input.stepIds)) !== input.stepIds.length) {
      throw new AppError("invalid_input", "One of the steps is no longer there. Load the page again.");
    }
    if ((await countUsableTasks(trx, organisationId, input.taskIds)) !== input.taskIds.length) {
      throw new AppError("invalid_input", "One of the tasks can't be used by this workshop.");
    }
    await replaceModuleSteps(trx, { organisationId, moduleId }, input.stepIds);
    await replaceModuleTasks(trx, { organisationId, moduleId }, input.taskIds);
    return { version: await updateModule(trx, moduleId, input) };
  });
}
