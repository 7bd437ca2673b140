import { getDb } from "@/db/client";
import { listVehicles } from "@/db/reads/recordings";
import { assertAllowed } from "@/lib/core/decision";
import type { Actor } from "@/lib/core/roles";
import { canWorkOnRecordings } from "@/lib/policies/recordings";

/** The workshop's vehicles, for saying which one a recording shows. @throws AppError("forbidden") */
export async function viewVehicles(actor: Actor): Promise<{ id: string; label: string; model: string }[]> {
  assertAllowed(canWorkOnRecordings(actor));
  return listVehicles(getDb(), actor.organisation.id);
}
