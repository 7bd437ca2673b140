import { getDb } from "@/db/client";
import { listRunsToConfirm, type RunToConfirm } from "@/db/reads/runs-to-confirm";
import { AppError } from "@/lib/core/errors";
import type { Actor } from "@/lib/core/roles";
import type { Plate } from "@/lib/services/cohorts/view-plate";
import { viewWorkshopPlate } from "@/lib/services/workshop/view-workshop-plate";

export type ApprenticesView = { plate: Plate; runs: RunToConfirm[] };

/** A mentor's apprentices: where they stand, and which practice runs wait for a witness. @throws AppError("forbidden") */
export async function viewApprentices(actor: Actor): Promise<ApprenticesView> {
  if (!actor.roles.has("mentor")) throw new AppError("forbidden", "This page is a mentor’s.");
  return { plate: await viewWorkshopPlate(actor), runs: await listRunsToConfirm(getDb(), actor.organisation.id) };
}
