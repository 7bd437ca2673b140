import { getDb } from "@/db/client";
import { listOpenSheets, type OpenSheet } from "@/db/reads/open-sheets";
import { AppError } from "@/lib/core/errors";
import type { Actor } from "@/lib/core/roles";

/** The sheets that this assessor has open. @throws AppError("forbidden") */
export async function viewOpenSheets(actor: Actor): Promise<OpenSheet[]> {
  if (!actor.roles.has("assessor")) throw new AppError("forbidden", "This page is an assessor’s.");
  return listOpenSheets(getDb(), actor.organisation.id, actor.personId);
}
