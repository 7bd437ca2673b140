import { getDb } from "@/db/client";
import { listUsableTaskRevisions } from "@/db/queries/tasks";
import { listOwnSignOffs } from "@/db/reads/own-sign-offs";
import { AppError } from "@/lib/core/errors";
import type { Actor } from "@/lib/core/roles";
import type { Standing } from "@/lib/core/standing/types";
import type { Level, Outcome } from "@/lib/core/tasks/types";
import { listStandings } from "@/lib/services/standing/list-standings";

export type RecordView = {
  tasks: { id: string; title: string; standing: Standing }[];
  signOffs: { signOffId: string; task: string; signedAt: Date; outcome: Outcome; level: Level | null; assessor: string; withdrawn: boolean }[];
};

/** An apprentice's own record: what is held, and every signed sheet, wherever it was signed. @throws AppError("forbidden") */
export async function viewRecord(actor: Actor): Promise<RecordView> {
  if (!actor.roles.has("apprentice")) throw new AppError("forbidden", "This page is an apprentice’s own record.");
  const db = getDb();
  const tasks = await listUsableTaskRevisions(db, actor.organisation.id);
  const standings = await listStandings(db, [actor.personId], tasks.map((task) => task.taskId));
  return {
    tasks: tasks
      .map(({ taskId, content }) => ({ id: taskId, title: content.title, standing: standings.of(actor.personId, taskId).standing }))
      .filter(({ standing }) => standing.held.kind !== "nothing")
      .toSorted((a, b) => a.title.localeCompare(b.title)),
    signOffs: await listOwnSignOffs(db, actor.personId),
  };
}
