import type { Knex } from "knex";
import { getDb } from "@/db/client";
import {
  findModuleForUpdate,
  findNewestRevision,
  insertModuleRevision,
  listDraftQuestions,
  listDraftSteps,
  listDraftTaskIds,
  listPublishGates,
  type ModuleRow,
  type PublishGate,
} from "@/db/queries/modules";
import { assertAllowed } from "@/lib/core/decision";
import { AppError } from "@/lib/core/errors";
import { moduleProblems } from "@/lib/core/modules/module-problems";
import { revisionHash } from "@/lib/core/modules/revision-hash";
import type { ModuleContent } from "@/lib/core/modules/types";
import type { Actor } from "@/lib/core/roles";
import { stepPublishProblems } from "@/lib/core/steps/publish-problems";
import { canWriteModules } from "@/lib/policies/modules";
import type { PublishModuleInput } from "@/lib/schemas/modules";
import { appendEntry } from "@/lib/services/ledger/append-entry";

/** The draft as it would be frozen. */
export async function draftContent(trx: Knex | Knex.Transaction, module: ModuleRow): Promise<ModuleContent> {
  const steps = await listDraftSteps(trx, module.id);
  const questions = await listDraftQuestions(trx, module.id);
  const taskIds = await listDraftTaskIds(trx, module.id);
  return { title: module.title, summary: module.summary, steps, questions, passRule: { share: module.passShare }, taskIds };
}

/** Everything that stands between a draft and its publishing, as sentences. */
export function publishProblems(content: ModuleContent, gates: PublishGate[]): string[] {
  return [
    ...moduleProblems(content),
    ...content.steps.flatMap((step) => stepPublishProblems(step)),
    ...gates.flatMap((gate) => [
      ...(gate.ready ? [] : [`“${gate.title}” is not ready to play yet.`]),
      ...(gate.consentAnswered ? [] : [`“${gate.title}”: say who is in shot and that they agreed.`]),
      ...(gate.privateDetailsChecked ? [] : [`“${gate.title}”: look it through for number plates, VINs and customers' papers, and say so.`]),
    ]),
  ];
}

/**
 * Freezes the draft as the module's next revision and records it in the workshop's ledger, both or neither.
 * @throws AppError("forbidden" | "not_found" | "conflict" when saved in between or unchanged | "invalid_input" with every problem)
 */
export async function publishModule(
  actor: Actor,
  moduleId: string,
  input: PublishModuleInput,
): Promise<{ number: number; contentHash: string }> {
  assertAllowed(canWriteModules(actor));
  const organisationId = actor.organisation.id;
  return getDb().transaction(async (trx) => {
    const module = await findModuleForUpdate(trx, organisationId, moduleId);
    if (!module) throw new AppError("not_found", "There is no such module.");
    if (module.version !== input.version) throw new AppError("conflict", "The draft changed meanwhile. Look it through again before publishing.");

    const content = await draftContent(trx, module);
    const problems = publishProblems(content, await listPublishGates(trx, moduleId));
    if (problems.length > 0) {
      const fields = problems.map((message) => ({ path: "", message }));
      throw new AppError("invalid_input", "This can't be published yet.", fields);
    }
    const contentHash = revisionHash(content);
    const before = await findNewestRevision(trx, organisationId, moduleId);
    if (before && before.contentHash === contentHash) throw new AppError("conflict", `Nothing changed since revision ${before.number}.`);

    const number = (before?.number ?? 0) + 1;
    // The first revision can't have changed any work that somebody was signed off for.
    const workChanged = before !== undefined && input.workChanged;
    await insertModuleRevision(trx, {
      organisationId,
      moduleId,
      number,
      content,
      contentHash,
      workChanged,
      publishedBy: actor.personId,
    });
    await appendEntry(trx, organisationId, {
      kind: "module_revision",
      subject: { moduleId, number, contentHash, workChanged },
      personal: [{ personId: actor.personId, label: "published_by", value: actor.name }],
    });
    return { number, contentHash };
  });
}
