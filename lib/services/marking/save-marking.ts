import type { Knex } from "knex";
import { getDb } from "@/db/client";
import { bumpMarkingVersion, findMarkedRecordingForUpdate, replaceMarking, type MarkedRecording } from "@/db/queries/marking";
import { assertAllowed } from "@/lib/core/decision";
import { AppError, type FieldProblem } from "@/lib/core/errors";
import { questionProblems } from "@/lib/core/questions/question-problems";
import type { Question } from "@/lib/core/questions/types";
import type { Actor } from "@/lib/core/roles";
import { parseTightening } from "@/lib/core/steps/parse-tightening";
import { stepProblems } from "@/lib/core/steps/step-problems";
import type { Step } from "@/lib/core/steps/types";
import { canMarkOut } from "@/lib/policies/marking";
import type { MarkingInput } from "@/lib/schemas/marking";

/**
 * Saves the marking out of a recording as a whole.
 * @returns the new version
 * @throws AppError("forbidden" | "not_found" | "conflict" when somebody saved in between | "invalid_input" with every problem)
 */
export async function saveMarking(actor: Actor, recordingId: string, input: MarkingInput): Promise<{ version: number }> {
  assertAllowed(canMarkOut(actor));
  return getDb().transaction(async (trx) => {
    const recording = await lockForMarking(trx, actor, recordingId, input.version);
    return { version: await writeMarking(trx, actor, recording, input) };
  });
}

/** @throws AppError("not_found" | "conflict") */
export async function lockForMarking(trx: Knex.Transaction, actor: Actor, recordingId: string, version: number): Promise<MarkedRecording> {
  const recording = await findMarkedRecordingForUpdate(trx, actor.organisation.id, recordingId);
  if (!recording) throw new AppError("not_found", "There is no such recording.");
  if (recording.version !== version) {
    throw new AppError("conflict", "Somebody else saved this marking out meanwhile. Yours is kept here; load theirs to compare.");
  }
  return recording;
}

/** Checks and writes; the caller holds the lock. @throws AppError("invalid_input") */
export async function writeMarking(
  trx: Knex.Transaction,
  actor: Actor,
  recording: MarkedRecording,
  marking: { steps: Step[]; questions: Question[] },
): Promise<number> {
  const { steps, problems } = understandTightening(marking.steps);
  problems.push(...stepProblems(steps, recording.durationMs ?? 0).map((message) => ({ path: "steps", message })));
  for (const [index, question] of marking.questions.entries()) {
    const step = steps.find((candidate) => candidate.id === question.stepId);
    problems.push(...questionProblems(question, step).map((message) => ({ path: `questions.${index}`, message: `“${question.prompt}”: ${message}` })));
  }
  if (problems.length > 0) throw new AppError("invalid_input", "Some of this can't be kept as it is. Nothing was changed.", problems);
  const at = { organisationId: actor.organisation.id, recordingId: recording.id };
  if (!(await replaceMarking(trx, at, { steps, questions: marking.questions }))) {
    throw new AppError("invalid_input", "A step or question has the id of another recording's.");
  }
  return bumpMarkingVersion(trx, recording.id, actor.personId);
}

/** The server understands tightening values itself; the numbers that came along are not believed. */
function understandTightening(steps: Step[]): { steps: Step[]; problems: FieldProblem[] } {
  const problems: FieldProblem[] = [];
  const understood = steps.map((step) => ({
    ...step,
    facts: {
      ...step.facts,
      fasteners: step.facts.fasteners.map((fastener) => {
        if (!fastener.tightening) return fastener;
        const parsed = parseTightening(fastener.tightening.entered);
        if ("problem" in parsed) {
          problems.push({ path: "steps", message: `“${step.title}”, ${fastener.name}: ${parsed.problem}` });
          return fastener;
        }
        return { ...fastener, tightening: { ...fastener.tightening, ...parsed } };
      }),
    },
  }));
  return { steps: understood, problems };
}
