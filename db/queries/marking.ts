import type { Knex } from "knex";
import type { Db } from "@/db/client";
import type { Question, QuestionBody } from "@/lib/core/questions/types";
import type { Step } from "@/lib/core/steps/types";

/** A recording as far as marking out goes. `durationMs` is null until the film was measured. */
export type MarkedRecording = { id: string; title: string; durationMs: number | null; version: number };

const recordings = (db: Db, organisationId: string, id: string) =>
  db("recordings")
    .select("id", "title", "duration_ms", "marking_version")
    .where({ organisation_id: organisationId, id })
    .whereNull("hidden_at");

const toRecording = (row: Awaited<ReturnType<typeof recordings>>[number]): MarkedRecording => ({
  id: row.id,
  title: row.title,
  durationMs: row.duration_ms,
  version: row.marking_version,
});

/** A recording of this organisation that is not put away. */
export async function findMarkedRecording(db: Db, organisationId: string, id: string): Promise<MarkedRecording | undefined> {
  const row = await recordings(db, organisationId, id).first();
  return row && toRecording(row);
}

/** Locks the recording, so that two mentors save one after the other and the second sees the first's version. */
export async function findMarkedRecordingForUpdate(trx: Knex.Transaction, organisationId: string, id: string): Promise<MarkedRecording | undefined> {
  const row = await recordings(trx, organisationId, id).forUpdate().first();
  return row && toRecording(row);
}

/** Steps in the order of the film. */
export async function listSteps(db: Db, recordingId: string): Promise<Step[]> {
  const rows = await db("steps").select("id", "title", "start_ms", "end_ms", "facts").where({ recording_id: recordingId }).orderBy("start_ms");
  return rows.map((row) => ({ id: row.id, title: row.title, startMs: row.start_ms, endMs: row.end_ms, facts: row.facts }));
}

/** Questions with their answers, in the order of the film. */
export async function listQuestions(db: Db, recordingId: string): Promise<Question[]> {
  const rows = await db("questions")
    .select("id", "step_id", "at_ms", "prompt", "explanation", "look_again_ms", "safety_critical", "body")
    .where({ recording_id: recordingId })
    .orderBy(["at_ms", "id"]);
  return rows.map(toQuestion);
}

type QuestionRow = {
  id: string;
  step_id: string;
  at_ms: number;
  prompt: string;
  explanation: string;
  look_again_ms: number;
  safety_critical: boolean;
  body: QuestionBody;
};

/** A question's row as the product knows it. */
export const toQuestion = (row: QuestionRow): Question => ({
  id: row.id,
  stepId: row.step_id,
  atMs: row.at_ms,
  prompt: row.prompt,
  explanation: row.explanation,
  lookAgainMs: row.look_again_ms,
  safetyCritical: row.safety_critical,
  body: row.body,
});

/** Which of these ids of steps or questions belong to other recordings already. */
export async function listTakenIds(db: Db, recordingId: string, ids: readonly string[]): Promise<Set<string>> {
  const taken = (table: "steps" | "questions") => db(table).select<{ id: string }[]>("id").whereIn("id", ids).whereNot({ recording_id: recordingId });
  return new Set([...(await taken("steps")), ...(await taken("questions"))].map(({ id }) => id));
}

/**
 * Makes the recording's steps and questions those given. A step that stays keeps its row, and with it its place in modules; the ids of
 * other recordings' steps can't be taken over.
 * @returns false where an id belongs to another recording
 */
export async function replaceMarking(
  trx: Knex.Transaction,
  at: { organisationId: string; recordingId: string },
  marking: { steps: readonly Step[]; questions: readonly Question[] },
): Promise<boolean> {
  const recording = { organisation_id: at.organisationId, recording_id: at.recordingId };
  const stepIds = marking.steps.map((step) => step.id);
  const questionIds = marking.questions.map((question) => question.id);
  await trx("questions").where({ recording_id: at.recordingId }).whereNotIn("id", questionIds).delete();
  await trx("steps").where(recording).whereNotIn("id", stepIds).delete();
  if (marking.steps.length > 0) {
    const written = await trx("steps")
      .insert(marking.steps.map((step) => ({ ...recording, id: step.id, title: step.title, start_ms: step.startMs, end_ms: step.endMs, facts: JSON.stringify(step.facts) })))
      .onConflict("id")
      .merge(["title", "start_ms", "end_ms", "facts"])
      .where({ "steps.recording_id": at.recordingId })
      .returning("id");
    if (written.length !== stepIds.length) return false;
  }
  if (marking.questions.length > 0) {
    const written = await trx("questions")
      .insert(
        marking.questions.map((question) => ({
          recording_id: at.recordingId,
          id: question.id,
          step_id: question.stepId,
          at_ms: question.atMs,
          kind: question.body.kind,
          prompt: question.prompt,
          explanation: question.explanation,
          look_again_ms: question.lookAgainMs,
          safety_critical: question.safetyCritical,
          body: JSON.stringify(question.body),
        })),
      )
      .onConflict("id")
      .merge(["step_id", "at_ms", "kind", "prompt", "explanation", "look_again_ms", "safety_critical", "body"])
      .where({ "questions.recording_id": at.recordingId })
      .returning("id");
    if (written.length !== questionIds.length) return false;
  }
  return true;
}

/** Notes the save and returns the new version. */
export async function bumpMarkingVersion(trx: Knex.Transaction, recordingId: string, savedBy: string): Promise<number> {
  const [row] = await trx("recordings")
    .where({ id: recordingId })
    .update({ marking_version: trx.raw("marking_version + 1"), marking_saved_at: trx.fn.now(), marking_saved_by: savedBy })
    .returning<{ marking_version: number }[]>("marking_version");
  if (!row) throw new Error("The recording's row did not come back.");
  return row.marking_version;
}
