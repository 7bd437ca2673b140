import { getDb } from "@/db/client";
import { findUsableTaskRevision, listUsableTaskRevisions, type TaskRevision } from "@/db/queries/tasks";
import { AppError } from "@/lib/core/errors";
import type { Actor } from "@/lib/core/roles";

const READERS = ["mentor", "assessor", "liaison", "manager", "verifier"] as const;

function assertReader(actor: Actor): void {
  if (!READERS.some((role) => actor.roles.has(role))) throw new AppError("forbidden", "Your own tasks are under Tasks.");
}

/** Every published task that the organisation uses. @throws AppError("forbidden") */
export async function viewTasks(actor: Actor): Promise<TaskRevision[]> {
  assertReader(actor);
  const tasks = await listUsableTaskRevisions(getDb(), actor.organisation.id);
  return tasks.toSorted((a, b) => a.content.area.localeCompare(b.content.area) || a.content.title.localeCompare(b.content.title));
}

/** One task, its newest revision. @throws AppError("not_found" | "forbidden") */
export async function viewTask(actor: Actor, taskId: string): Promise<TaskRevision> {
  assertReader(actor);
  const task = await findUsableTaskRevision(getDb(), actor.organisation.id, taskId);
  if (!task) throw new AppError("not_found", "There is no such task.");
  return task;
}
