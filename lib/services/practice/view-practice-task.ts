import { getDb } from "@/db/client";
import { listEvidence, listPracticeRuns, type PracticeRun } from "@/db/queries/practice";
import { listModulesFor, listSignedObservations, type SignedObservation } from "@/db/reads/task-history";
import type { Actor } from "@/lib/core/roles";
import type { Standing } from "@/lib/core/standing/types";
import { readyProblems } from "@/lib/core/tasks/ready-problems";
import type { TaskContent } from "@/lib/core/tasks/types";
import { myTask } from "@/lib/services/practice/my-task";
import { listStandings } from "@/lib/services/standing/list-standings";
import { getStore } from "@/storage/store";

export type PracticeTaskView = {
  taskId: string;
  content: TaskContent;
  standing: Standing;
  missing: string[];
  readySince: Date | null;
  bookedFor: Date | null;
  runs: PracticeRun[];
  evidence: { id: string; note: string; url: string }[];
  history: SignedObservation[];
  modules: { assignmentId: string; title: string; known: boolean }[];
};

const PHOTO_SECONDS = 6 * 3600;

/**
 * One task as the apprentice works towards it. The criteria are the very ones that the assessor will use: no surprise.
 * @throws AppError("not_found" | "forbidden")
 */
export async function viewPracticeTask(actor: Actor, taskId: string): Promise<PracticeTaskView> {
  const db = getDb();
  const { content } = await myTask(db, actor, taskId);
  const mine = { apprenticeId: actor.personId, taskId };
  const { standing, progress } = (await listStandings(db, [actor.personId], [taskId])).of(actor.personId, taskId);
  const photos = await listEvidence(db, mine);
  return {
    taskId,
    content,
    standing,
    missing: readyProblems(content.rule, progress),
    readySince: progress.readySince,
    bookedFor: progress.bookedFor,
    runs: await listPracticeRuns(db, mine),
    evidence: await Promise.all(
      photos.map(async (photo) => ({
        id: photo.id,
        note: photo.note,
        url: await getStore().presignGet(photo.storeKey, PHOTO_SECONDS, { responseContentType: photo.mediaType }),
      })),
    ),
    history: await listSignedObservations(db, mine),
    modules: await listModulesFor(db, { ...mine, organisationId: actor.organisation.id }),
  };
}
