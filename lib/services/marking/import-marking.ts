import { randomUUID } from "node:crypto";
import type { Knex } from "knex";
import { getDb } from "@/db/client";
import { listQuestions, listSteps, listTakenIds } from "@/db/queries/marking";
import { findMarking } from "@/db/reads/marking";
import { assertAllowed } from "@/lib/core/decision";
import { AppError } from "@/lib/core/errors";
import type { Actor } from "@/lib/core/roles";
import { canMarkOut } from "@/lib/policies/marking";
import type { ImportMarkingInput, MarkingView } from "@/lib/schemas/marking";
import { readTracks, type Draft } from "@/lib/services/marking/read-tracks";
import { lockForMarking, writeMarking } from "@/lib/services/marking/save-marking";

/**
 * Replaces steps, facts and questions by what WebVTT files say: whole or not at all. A file of another recording may be taken too; what it
 * marks out gets ids of its own then.
 * @returns the marking out as it stands now
 * @throws AppError("forbidden" | "not_found" | "conflict"; "invalid_input" with file and line of every problem)
 */
export async function importMarking(actor: Actor, recordingId: string, input: ImportMarkingInput): Promise<MarkingView> {
  assertAllowed(canMarkOut(actor));
  return getDb().transaction(async (trx) => {
    const film = await lockForMarking(trx, actor, recordingId, input.version);
    const before = { steps: await listSteps(trx, recordingId), questions: await listQuestions(trx, recordingId) };
    const read = readTracks(input, before, film.durationMs, randomUUID);
    if ("problems" in read) throw new AppError("invalid_input", "The files were refused. Nothing was changed.", read.problems);
    await writeMarking(trx, actor, film, await withOwnIds(trx, recordingId, read));
    const marking = await findMarking(trx, actor.organisation.id, recordingId);
    if (!marking) throw new Error("The recording was locked and is gone.");
    return { ...marking, savedAt: marking.savedAt?.toISOString() ?? null };
  });
}

async function withOwnIds(trx: Knex.Transaction, recordingId: string, { steps, questions }: Draft): Promise<Draft> {
  const taken = await listTakenIds(trx, recordingId, [...steps, ...questions].map(({ id }) => id));
  const own = new Map([...taken].map((id) => [id, randomUUID() as string]));
  const idOf = (id: string): string => own.get(id) ?? id;
  return {
    steps: steps.map((step) => ({ ...step, id: idOf(step.id) })),
    questions: questions.map((question) => ({ ...question, id: idOf(question.id), stepId: idOf(question.stepId) })),
  };
}
