import type { Knex } from "knex";
import type { Db } from "@/db/client";
import { toQuestion } from "@/db/queries/marking";
import type { ModuleContent, ModuleStep } from "@/lib/core/modules/types";
import type { Question } from "@/lib/core/questions/types";

export type ModuleRow = { id: string; title: string; summary: string; passShare: number; version: number };

const toModule = (row: { id: string; title: string; summary: string; pass_share: number; version: number }): ModuleRow => ({
  id: row.id,
  title: row.title,
  summary: row.summary,
  passShare: row.pass_share,
  version: row.version,
});
const moduleColumns = ["id", "title", "summary", "pass_share", "version"] as const;

export async function findModule(db: Db, organisationId: string, id: string): Promise<ModuleRow | undefined> {
  const row = await db("modules").select(moduleColumns).where({ organisation_id: organisationId, id }).whereNull("retired_at").first();
  return row && toModule(row);
}

/** Locks the module until the transaction ends, so that two mentors can't save or publish over each other. */
export async function findModuleForUpdate(trx: Knex.Transaction, organisationId: string, id: string): Promise<ModuleRow | undefined> {
  const row = await trx("modules")
    .select(moduleColumns)
    .where({ organisation_id: organisationId, id })
    .whereNull("retired_at")
    .forUpdate()
    .first();
  return row && toModule(row);
}

export async function insertModule(
  trx: Knex.Transaction,
  of: { organisationId: string; title: string; passShare: number; createdBy: string },
): Promise<string> {
  const [row] = await trx("modules")
    .insert({ organisation_id: of.organisationId, title: of.title, pass_share: of.passShare, created_by: of.createdBy })
    .returning<{ id: string }[]>("id");
  if (!row) throw new Error("The module's row did not come back.");
  return row.id;
}

/** Saves the draft's own fields and returns the new version. */
export async function updateModule(
  trx: Knex.Transaction,
  id: string,
  draft: { title: string; summary: string; passShare: number },
): Promise<number> {
  const [row] = await trx("modules")
    .where({ id })
    .update({ title: draft.title, summary: draft.summary, pass_share: draft.passShare, version: trx.raw("version + 1") })
    .returning<{ version: number }[]>("version");
  if (!row) throw new Error("The module's row did not come back.");
  return row.version;
}

export async function replaceModuleSteps(trx: Knex.Transaction, of: { organisationId: string; moduleId: string }, stepIds: string[]): Promise<void> {
  await trx("module_steps").where({ module_id: of.moduleId }).delete();
  if (stepIds.length === 0) return;
  await trx("module_steps").insert(
    stepIds.map((stepId, position) => ({ organisation_id: of.organisationId, module_id: of.moduleId, step_id: stepId, position })),
  );
}

export async function replaceModuleTasks(trx: Knex.Transaction, of: { organisationId: string; moduleId: string }, taskIds: string[]): Promise<void> {
  await trx("module_tasks").where({ module_id: of.moduleId }).delete();
  if (taskIds.length === 0) return;
  await trx("module_tasks").insert(taskIds.map((taskId) => ({ organisation_id: of.organisationId, module_id: of.moduleId, task_id: taskId })));
}

/** Ids of a recording's steps in the order of the film. */
export async function listStepIds(db: Db, organisationId: string, recordingId: string): Promise<string[]> {
  const rows = await db("steps").select("id").where({ organisation_id: organisationId, recording_id: recordingId }).orderBy("start_ms");
  return rows.map((row) => row.id);
}

/** How many of these steps belong to the organisation: all of them, or somebody sent an id that isn't theirs. */
export async function countOwnSteps(db: Db, organisationId: string, stepIds: string[]): Promise<number> {
  const row = await db("steps").count("id as n").where({ organisation_id: organisationId }).whereIn("id", stepIds).first();
  return Number(row?.n ?? 0);
}

/** The draft's steps in the module's order. */
export async function listDraftSteps(db: Db, moduleId: string): Promise<ModuleStep[]> {
  const rows = await db("module_steps as ms")
    .join("steps as s", "s.id", "ms.step_id")
    .select("s.id", "s.recording_id", "s.title", "s.start_ms", "s.end_ms", "s.facts")
    .where("ms.module_id", moduleId)
    .orderBy("ms.position");
  return rows.map((row) => ({
    id: row.id,
    recordingId: row.recording_id,
    title: row.title,
    startMs: row.start_ms,
    endMs: row.end_ms,
    facts: row.facts,
  }));
}

/** Questions of the draft's steps, with their answers: for the server only. */
export async function listDraftQuestions(db: Db, moduleId: string): Promise<Question[]> {
  const rows = await db("module_steps as ms")
    .join("questions as q", "q.step_id", "ms.step_id")
    .select("q.id", "q.step_id", "q.at_ms", "q.prompt", "q.explanation", "q.look_again_ms", "q.safety_critical", "q.body")
    .where("ms.module_id", moduleId)
    .orderBy(["ms.position", "q.at_ms", "q.id"]);
  return rows.map(toQuestion);
}

export async function listDraftTaskIds(db: Db, moduleId: string): Promise<string[]> {
  const rows = await db("module_tasks").select("task_id").where({ module_id: moduleId }).orderBy("task_id");
  return rows.map((row) => row.task_id);
}

export type ModuleRevision = { id: string; moduleId: string; number: number; content: ModuleContent; contentHash: string };

export async function findNewestRevision(db: Db, organisationId: string, moduleId: string): Promise<ModuleRevision | undefined> {
  const row = await db("module_revisions")
    .select("id", "module_id", "number", "content", "content_hash")
    .where({ organisation_id: organisationId, module_id: moduleId })
    .orderBy("number", "desc")
    .first();
  return row && { id: row.id, moduleId: row.module_id, number: row.number, content: row.content, contentHash: row.content_hash };
}

/** Writes a frozen revision with the tasks that it opens and the recordings that it plays. */
export async function insertModuleRevision(
  trx: Knex.Transaction,
  of: { organisationId: string; moduleId: string; number: number; content: ModuleContent; contentHash: string; workChanged: boolean; publishedBy: string },
): Promise<string> {
  const [row] = await trx("module_revisions")
    .insert({
      organisation_id: of.organisationId,
      module_id: of.moduleId,
      number: of.number,
      content: JSON.stringify(of.content),
      content_hash: of.contentHash,
      work_changed: of.workChanged,
      published_by: of.publishedBy,
    })
    .returning<{ id: string }[]>("id");
  if (!row) throw new Error("The revision's row did not come back.");
  const revisionId = row.id;
  if (of.content.taskIds.length > 0) {
    await trx("module_revision_tasks").insert(of.content.taskIds.map((taskId) => ({ module_revision_id: revisionId, task_id: taskId })));
  }
  const recordingIds = [...new Set(of.content.steps.map((step) => step.recordingId))];
  await trx("module_revision_recordings").insert(
    recordingIds.map((recordingId) => ({ organisation_id: of.organisationId, module_revision_id: revisionId, recording_id: recordingId })),
  );
  return revisionId;
}

export type PublishGate = { title: string; ready: boolean; consentAnswered: boolean; privateDetailsChecked: boolean };

/** What each recording of the draft still owes before others may see it. */
export async function listPublishGates(db: Db, moduleId: string): Promise<PublishGate[]> {
  const rows = await db("module_steps as ms")
    .join("steps as s", "s.id", "ms.step_id")
    .join("recordings as r", "r.id", "s.recording_id")
    .distinct("r.id", "r.title", "r.state", "r.consent", "r.private_details_checked_at")
    .where("ms.module_id", moduleId)
    .orderBy("r.title");
  return rows.map((row) => ({
    title: row.title,
    ready: row.state === "ready",
    consentAnswered: row.consent !== null,
    privateDetailsChecked: row.private_details_checked_at !== null,
  }));
}
