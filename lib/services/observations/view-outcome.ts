import { getDb } from "@/db/client";
import { findSheet } from "@/db/queries/observations";
import type { Actor } from "@/lib/core/roles";
import type { SheetOutcome } from "@/lib/schemas/observations";
import { openSheet } from "@/lib/services/observations/mark-criterion";
import { computeSheet } from "@/lib/services/observations/sheet-outcome";

/**
 * What the assessor sees before signing.
 * @throws AppError("not_found" | "forbidden" | "conflict" when it was signed already)
 */
export async function viewOutcome(actor: Actor, observationId: string): Promise<SheetOutcome> {
  const db = getDb();
  const sheet = openSheet(await findSheet(db, actor.organisation.id, observationId), actor);
  const { outcome, cap } = await computeSheet(db, sheet);
  return { ...outcome, levelCap: cap.level, capReasons: cap.reasons };
}
