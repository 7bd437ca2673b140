import { getDb } from "@/db/client";
import { listUsableTaskRevisions } from "@/db/queries/tasks";
import { AppError } from "@/lib/core/errors";
import type { Actor } from "@/lib/core/roles";
import type { Standing } from "@/lib/core/standing/types";
import { readyProblems } from "@/lib/core/tasks/ready-problems";
import { listStandings } from "@/lib/services/standing/list-standings";

export type PracticeItem = { taskId: string; title: string; area: string; standing: Standing; readySince: string | null; missing: string[] };

/** Every task that an apprentice can work towards here, with their standing and what is missing before the next observation. */
export async function viewPractice(actor: Actor): Promise<PracticeItem[]> {
  if (!actor.roles.has("apprentice")) throw new AppError("forbidden", "This page is an apprentice’s.");
  const db = getDb();
  const tasks = await listUsableTaskRevisions(db, actor.organisation.id);
  const standings = await listStandings(db, [actor.personId], tasks.map((task) => task.taskId));
  return tasks
    .map(({ taskId, content }) => {
      const { standing, progress } = standings.of(actor.personId, taskId);
      return {
        taskId,
        title: content.title,
        area: content.area,
        standing,
        readySince: progress.readySince?.toISOString() ?? null,
        missing: readyProblems(content.rule, progress),
      };
    })
    .toSorted((a, b) => a.area.localeCompare(b.area) || a.title.localeCompare(b.title));
}
