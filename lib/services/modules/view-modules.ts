import { getDb } from "@/db/client";
import { listAvailableSteps, listModules, type ModuleListItem } from "@/db/reads/modules";
import { assertAllowed } from "@/lib/core/decision";
import type { Actor } from "@/lib/core/roles";
import { canWriteModules } from "@/lib/policies/modules";

export type ModulesView = {
  modules: ModuleListItem[];
  /** Recordings with steps, to begin a module from. */
  recordings: { id: string; title: string; steps: number }[];
};

/** @throws AppError("forbidden") */
export async function viewModules(actor: Actor): Promise<ModulesView> {
  assertAllowed(canWriteModules(actor));
  const db = getDb();
  const steps = await listAvailableSteps(db, actor.organisation.id);
  const recordings = new Map<string, { id: string; title: string; steps: number }>();
  for (const step of steps) {
    const known = recordings.get(step.recordingId) ?? { id: step.recordingId, title: step.recordingTitle, steps: 0 };
    recordings.set(step.recordingId, { ...known, steps: known.steps + 1 });
  }
  return { modules: await listModules(db, actor.organisation.id), recordings: [...recordings.values()] };
}
