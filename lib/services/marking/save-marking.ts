import type { Knex } from "knex";
import { getDb } from "@/db/client";
import { bumpMarkingVersion, findMarkedRecordingForUpdate, replaceMarking } from "@/db/queries/marking";
import { assertAllowed } from "@/lib/core/decision";
import { AppError } from "@/lib/core/errors";
import type { Question } from "@/lib/core/questions/types";
import type { Actor } from "@/lib/core/roles";
import type { Step } from "@/lib/core/steps/types";
import { canMarkOut } from "@/lib/policies/marking";
import type { MarkingInput } from "@/lib/schemas/marking";
import { markingProblems } from "@/lib/services/marking/marking-problems";
import { understandTightening } from "@/lib/services/marking/understand-tightening";

/**
 * Saves the marking out of a recording as a whole, on top of the version that it began from. Steps and questions keep their rows by their ids,
 * and with them their places in modules.
 * @returns the new version
 * @throws AppError("forbidden" | "not_found"; "conflict" when somebody saved in between or the film isn't measured; "invalid_input" with every problem)
 */
export async function saveMarking(actor: Actor, recordingId: string, input: MarkingInput): Promise<{ version: number }> {
  assertAllowed(canMarkOut(actor));
  return getDb().transaction(async (trx) => {
    const film = await lockForMarking(trx, actor, recordingId, input.version);
    return { version: await writeMarking(trx, actor, film, input) };
  });
}

export type LockedFilm = { recordingId: string; durationMs: number };

/** Holds the recording until the transaction ends, so that of two who save at once the second sees the first. @throws AppError("not_found" | "conflict") */
export async function lockForMarking(trx: Knex.Transaction, actor: Actor, recordingId: string, version: number): Promise<LockedFilm> {
  const recording = await findMarkedRecordingForUpdate(trx, actor.organisation.id, recordingId);
  if (!recording) throw new AppError("not_found", "There is no such recording.");
  if (recording.durationMs === null) throw new AppError("conflict", "The film has not been measured yet. It can be marked out once it plays.");
  if (recording.version !== version) throw new AppError("conflict", "This was saved from elsewhere meanwhile. Yours is kept here; load theirs to go on.");
  return { recordingId: recording.id, durationMs: recording.durationMs };
}

/** Checks and writes; the caller holds the lock. @returns the new version @throws AppError("invalid_input") */
export async function writeMarking(trx: Knex.Transaction, actor: Actor, film: LockedFilm, marking: { steps: Step[]; questions: Question[] }): Promise<number> {
  const understood = marking.steps.map((step) => ({ step, ...understandTightening(step.facts) }));
  const steps = understood.map(({ step, facts }) => ({ ...step, facts }));
  const problems = [
    ...understood.flatMap(({ step, problems }, index) =>
      problems.map(({ path, message }) => ({ path: `steps.${index}.facts.${path}`, message: `“${step.title}”, ${message}` })),
    ),
    ...markingProblems(steps, marking.questions, film.durationMs),
  ];
  if (problems.length > 0) throw new AppError("invalid_input", "Some of this can’t be kept as it is. Nothing was changed.", problems);
  const at = { organisationId: actor.organisation.id, recordingId: film.recordingId };
  if (!(await replaceMarking(trx, at, { steps, questions: marking.questions }))) {
    throw new AppError("invalid_input", "A step or question has the id of another recording’s. Nothing was changed.");
  }
  return bumpMarkingVersion(trx, film.recordingId, actor.personId);
}
