import { getDb } from "@/db/client";
import { listTrainees } from "@/db/queries/agreements";
import { findModule, findNewestRevision, listPublishGates } from "@/db/queries/modules";
import { listUsableTaskRevisions } from "@/db/queries/tasks";
import {
  countFirstAnswers,
  listAvailableSteps,
  listModuleHolders,
  listRevisions,
  type AvailableStep,
  type ModuleHolder,
  type RevisionListItem,
} from "@/db/reads/modules";
import { assertAllowed } from "@/lib/core/decision";
import { AppError } from "@/lib/core/errors";
import { revisionHash } from "@/lib/core/modules/revision-hash";
import type { Actor } from "@/lib/core/roles";
import { firstTimeRight, type FirstTimeRight } from "@/lib/core/statistics/first-time-right";
import { canWriteModules } from "@/lib/policies/modules";
import { draftContent, publishProblems } from "@/lib/services/modules/publish-module";

export type UnderstoodQuestion = { id: string; prompt: string; safetyCritical: boolean; first: FirstTimeRight };

export type ModuleView = {
  moduleId: string;
  version: number;
  title: string;
  summary: string;
  passShare: number;
  stepIds: string[];
  taskIds: string[];
  availableSteps: AvailableStep[];
  tasks: { id: string; title: string }[];
  problems: string[];
  /** Whether the draft differs from the newest revision. */
  changed: boolean;
  revisions: RevisionListItem[];
  holders: ModuleHolder[];
  apprentices: { id: string; name: string }[];
  understood: UnderstoodQuestion[];
};

/** A module as its mentors see it: draft, what keeps it from publishing, who holds it, what was understood. @throws AppError("not_found" | "forbidden") */
export async function viewModule(actor: Actor, moduleId: string): Promise<ModuleView> {
  assertAllowed(canWriteModules(actor));
  const db = getDb();
  const organisationId = actor.organisation.id;
  const module = await findModule(db, organisationId, moduleId);
  if (!module) throw new AppError("not_found", "There is no such module.");
  const content = await draftContent(db, module);
  const newest = await findNewestRevision(db, organisationId, moduleId);
  const first = await countFirstAnswers(db, organisationId, moduleId);
  const trainees = (await listTrainees(db, organisationId)).filter((trainee) => trainee.workshopId === organisationId);
  return {
    moduleId,
    version: module.version,
    title: module.title,
    summary: module.summary,
    passShare: module.passShare,
    stepIds: content.steps.map((step) => step.id),
    taskIds: content.taskIds,
    availableSteps: await listAvailableSteps(db, organisationId),
    tasks: (await listUsableTaskRevisions(db, organisationId)).map((task) => ({ id: task.taskId, title: task.content.title })),
    problems: publishProblems(content, await listPublishGates(db, moduleId)),
    changed: newest === undefined || newest.contentHash !== revisionHash(content),
    revisions: await listRevisions(db, organisationId, moduleId),
    holders: await listModuleHolders(db, organisationId, moduleId),
    apprentices: trainees.map((trainee) => ({ id: trainee.personId, name: trainee.name })),
    understood: (newest?.content.questions ?? content.questions).map((question) => {
      const { answers, right } = first.get(question.id) ?? { answers: 0, right: 0 };
      return { id: question.id, prompt: question.prompt, safetyCritical: question.safetyCritical, first: firstTimeRight(right, answers) };
    }),
  };
}
