import { getDb } from "@/db/client";
import { insertModule, listStepIds, replaceModuleSteps } from "@/db/queries/modules";
import { assertAllowed } from "@/lib/core/decision";
import { AppError } from "@/lib/core/errors";
import type { Actor } from "@/lib/core/roles";
import { canWriteModules } from "@/lib/policies/modules";
import type { NewModuleInput } from "@/lib/schemas/modules";

/** Share of the questions that a new module asks for until the mentor says otherwise. */
const FIRST_PASS_SHARE = 0.8;

/**
 * Begins a module, with all steps of one recording where one is named.
 * @throws AppError("forbidden" | "not_found")
 */
export async function createModule(actor: Actor, input: NewModuleInput): Promise<{ moduleId: string }> {
  assertAllowed(canWriteModules(actor));
  const organisationId = actor.organisation.id;
  return getDb().transaction(async (trx) => {
    const stepIds = input.recordingId ? await listStepIds(trx, organisationId, input.recordingId) : [];
    if (input.recordingId && stepIds.length === 0) throw new AppError("not_found", "That recording has no steps yet: mark it out first.");
    const moduleId = await insertModule(trx, {
      organisationId,
      title: input.title,
      passShare: FIRST_PASS_SHARE,
      createdBy: actor.personId,
    });
    await replaceModuleSteps(trx, { organisationId, moduleId }, stepIds);
    return { moduleId };
  });
}
