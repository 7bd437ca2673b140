import type { Db } from "@/db/client";
import type { Question } from "@/lib/core/questions/types";
import type { Step } from "@/lib/core/steps/types";
import { listQuestions, listSteps } from "@/db/queries/marking";

export type SavedMarking = { version: number; savedAt: Date | null; savedBy: string | null; steps: Step[]; questions: Question[] };

/** A recording's steps and questions with who saved them last; undefined where the organisation has no such recording. */
export async function findMarking(db: Db, organisationId: string, recordingId: string): Promise<SavedMarking | undefined> {
  const row = await db("recordings as r")
    .leftJoin("people as p", "p.id", "r.marking_saved_by")
    .select<{ version: number; saved_at: Date | null; saved_by: string | null }[]>("r.marking_version as version", "r.marking_saved_at as saved_at", "p.name as saved_by")
    .where({ "r.organisation_id": organisationId, "r.id": recordingId })
    .whereNull("r.hidden_at")
    .first();
  if (!row) return undefined;
  const [steps, questions] = [await listSteps(db, recordingId), await listQuestions(db, recordingId)];
  return { version: row.version, savedAt: row.saved_at, savedBy: row.saved_by, steps, questions };
}
