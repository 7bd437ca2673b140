import { getDb } from "@/db/client";
import { findMarking } from "@/db/reads/marking";
import { assertAllowed } from "@/lib/core/decision";
import { AppError } from "@/lib/core/errors";
import type { Actor } from "@/lib/core/roles";
import { canMarkOut } from "@/lib/policies/marking";
import type { MarkingView } from "@/lib/schemas/marking";

/** Steps and questions, with answers: for mentors; who saved them last, and when. @throws AppError("not_found" | "forbidden") */
export async function viewMarking(actor: Actor, recordingId: string): Promise<MarkingView> {
  assertAllowed(canMarkOut(actor));
  const marking = await findMarking(getDb(), actor.organisation.id, recordingId);
  if (!marking) throw new AppError("not_found", "There is no such recording.");
  return { ...marking, savedAt: marking.savedAt?.toISOString() ?? null };
}
