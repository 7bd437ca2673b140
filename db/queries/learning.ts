import type { Knex } from "knex";
import type { Db } from "@/db/client";
import type { Span } from "@/lib/core/coverage/spans";
import type { ModuleContent } from "@/lib/core/modules/types";
import type { IdMap } from "@/lib/core/questions/ask-question";
import type { GivenAnswer, Marked } from "@/lib/core/questions/types";

export type Assignment = {
  id: string;
  organisationId: string;
  apprenticeId: string;
  moduleId: string;
  number: number;
  content: ModuleContent;
  dueOn: string;
  withdrawnAt: Date | null;
  knowledgeMetAt: Date | null;
};

const assignments = (db: Db, organisationId: string, id: string) =>
  db("assignments as a")
    .join("module_revisions as r", "r.id", "a.module_revision_id")
    .select("a.id", "a.organisation_id", "a.apprentice_id", "a.module_id", "r.number", "r.content", "a.due_on", "a.withdrawn_at", "a.knowledge_met_at")
    .where({ "a.organisation_id": organisationId, "a.id": id });

const toAssignment = (row: Awaited<ReturnType<typeof assignments>>[number]): Assignment => ({
  id: row.id,
  organisationId: row.organisation_id,
  apprenticeId: row.apprentice_id,
  moduleId: row.module_id,
  number: row.number,
  content: row.content,
  dueOn: row.due_on,
  withdrawnAt: row.withdrawn_at,
  knowledgeMetAt: row.knowledge_met_at,
});

export async function findAssignment(db: Db, organisationId: string, id: string): Promise<Assignment | undefined> {
  const row = await assignments(db, organisationId, id).first();
  return row && toAssignment(row);
}

/** Locks the assignment, so that two answers or reports at once are taken one after the other. */
export async function findAssignmentForUpdate(trx: Knex.Transaction, organisationId: string, id: string): Promise<Assignment | undefined> {
  const row = await assignments(trx, organisationId, id).forUpdate("a").first();
  return row && toAssignment(row);
}

/** What was accepted as played, united by the database: recording id → spans in order. */
export async function listPlayed(db: Db, assignmentId: string): Promise<Map<string, Span[]>> {
  const rows = await db("played_spans as p")
    .select("p.recording_id")
    .select(db.raw("(SELECT json_agg(json_build_array(lower(r), upper(r)) ORDER BY lower(r)) FROM unnest(p.played) AS r) AS spans"))
    .where("p.assignment_id", assignmentId);
  return new Map(rows.map((row) => [row.recording_id, row.spans ?? []]));
}

/** Adds spans to what was played. The same part added twice is there once. */
export async function addPlayed(trx: Knex.Transaction, at: { assignmentId: string; recordingId: string }, spans: readonly Span[]): Promise<void> {
  if (spans.length === 0) return;
  const multirange = `{${spans.map(([start, end]) => `[${start},${end})`).join(",")}}`;
  await trx.raw(
    `INSERT INTO played_spans AS p (assignment_id, recording_id, played) VALUES (:assignmentId, :recordingId, :multirange::int4multirange)
     ON CONFLICT (assignment_id, recording_id) DO UPDATE SET played = p.played + excluded.played, updated_at = now()`,
    { ...at, multirange },
  );
}

/** Moves the person's one clock to now and says how long it ran, in ms; 0 when it starts. The row stays locked until the transaction ends. */
export async function moveClock(trx: Knex.Transaction, personId: string): Promise<number> {
  await trx.raw(`INSERT INTO play_clocks (person_id, last_report_at) VALUES (?, clock_timestamp()) ON CONFLICT DO NOTHING`, [personId]);
  const row = await trx("play_clocks").select("last_report_at").where({ person_id: personId }).forUpdate().first();
  const { rows } = await trx.raw(
    `UPDATE play_clocks SET last_report_at = clock_timestamp() WHERE person_id = :personId
     RETURNING extract(epoch FROM last_report_at - :before::timestamptz) * 1000 AS elapsed_ms`,
    { personId, before: row?.last_report_at ?? null },
  );
  return Math.max(0, Number(rows[0]?.elapsed_ms ?? 0));
}

export async function setKnowledgeMet(trx: Knex.Transaction, assignmentId: string): Promise<void> {
  await trx("assignments").where({ id: assignmentId }).whereNull("knowledge_met_at").update({ knowledge_met_at: trx.fn.now() });
}

/** Whether the latest answer to each question was right. */
export async function listLatestRight(db: Db, assignmentId: string): Promise<Map<string, boolean>> {
  const rows = await db("answers")
    .distinctOn("question_id")
    .select("question_id", "is_right")
    .where({ assignment_id: assignmentId })
    .orderBy([{ column: "question_id" }, { column: "answered_at", order: "desc" }]);
  return new Map(rows.map((row) => [row.question_id, row.is_right]));
}

/** Opens the next attempt at a question. Called with the assignment locked, so numbers have no gap and no twin. */
export async function insertAttempt(
  trx: Knex.Transaction,
  of: { id: string; organisationId: string; assignmentId: string; questionId: string; idMap: IdMap },
): Promise<void> {
  await trx.raw(
    `INSERT INTO question_attempts (id, organisation_id, assignment_id, question_id, number, id_map)
     SELECT :id, :organisationId, :assignmentId, :questionId, coalesce(max(number), 0) + 1, :idMap::jsonb
     FROM question_attempts WHERE assignment_id = :assignmentId AND question_id = :questionId`,
    { ...of, idMap: JSON.stringify(of.idMap) },
  );
}

export type Attempt = { id: string; questionId: string; idMap: IdMap };

export async function findAttempt(db: Db, assignmentId: string, id: string): Promise<Attempt | undefined> {
  const row = await db("question_attempts").select("id", "question_id", "id_map").where({ assignment_id: assignmentId, id }).first();
  return row && { id: row.id, questionId: row.question_id, idMap: row.id_map };
}

/** The mark of an attempt that was answered before. */
export async function findMark(db: Db, attemptId: string): Promise<Marked | undefined> {
  const row = await db("answers").select("is_right", "diagnosis").where({ attempt_id: attemptId }).first();
  return row && { right: row.is_right, diagnosis: row.diagnosis };
}

export async function insertAnswer(
  trx: Knex.Transaction,
  of: { attemptId: string; organisationId: string; assignmentId: string; questionId: string; given: GivenAnswer; marked: Marked },
): Promise<void> {
  await trx("answers").insert({
    attempt_id: of.attemptId,
    organisation_id: of.organisationId,
    assignment_id: of.assignmentId,
    question_id: of.questionId,
    given: JSON.stringify(of.given),
    is_right: of.marked.right,
    diagnosis: of.marked.diagnosis,
  });
}

/** Lengths of recordings in ms. */
export async function listDurations(db: Db, organisationId: string, recordingIds: string[]): Promise<Map<string, number>> {
  const rows = await db("recordings").select("id", "duration_ms").where({ organisation_id: organisationId }).whereIn("id", recordingIds);
  return new Map(rows.map((row) => [row.id, row.duration_ms ?? 0]));
}
