import type { Db } from "@/db/client";

export type ModuleListItem = {
  id: string;
  title: string;
  steps: number;
  questions: number;
  newestNumber: number | null;
  publishedAt: Date | null;
  holders: number;
  knowing: number;
};

/** Every module of a workshop with how far it is and who holds it; one query however many there are. */
export async function listModules(db: Db, organisationId: string): Promise<ModuleListItem[]> {
  const { rows } = await db.raw(
    `SELECT m.id, m.title,
       (SELECT count(*) FROM module_steps ms WHERE ms.module_id = m.id) AS steps,
       (SELECT count(*) FROM module_steps ms JOIN questions q ON q.step_id = ms.step_id WHERE ms.module_id = m.id) AS questions,
       r.number AS newest_number, r.published_at,
       coalesce(h.holders, 0) AS holders, coalesce(h.knowing, 0) AS knowing
     FROM modules m
     LEFT JOIN LATERAL (
       SELECT number, published_at FROM module_revisions WHERE module_id = m.id ORDER BY number DESC LIMIT 1) r ON true
     LEFT JOIN (
       SELECT module_id, count(*) AS holders, count(knowledge_met_at) AS knowing
       FROM assignments WHERE withdrawn_at IS NULL GROUP BY module_id) h ON h.module_id = m.id
     WHERE m.organisation_id = ? AND m.retired_at IS NULL
     ORDER BY m.title`,
    [organisationId],
  );
  return rows.map((row: Record<string, never>) => ({
    id: row.id,
    title: row.title,
    steps: row.steps,
    questions: row.questions,
    newestNumber: row.newest_number,
    publishedAt: row.published_at,
    holders: row.holders,
    knowing: row.knowing,
  }));
}

export type AvailableStep = { id: string; title: string; recordingId: string; recordingTitle: string; startMs: number; endMs: number; questions: number };

/** Every step that a module of this workshop can be made of, recording by recording. */
export async function listAvailableSteps(db: Db, organisationId: string): Promise<AvailableStep[]> {
  const rows = await db("steps as s")
    .join("recordings as r", "r.id", "s.recording_id")
    .leftJoin("questions as q", "q.step_id", "s.id")
    .select("s.id", "s.title", "s.recording_id", "r.title as recording_title", "s.start_ms", "s.end_ms")
    .count("q.id as questions")
    .where("s.organisation_id", organisationId)
    .whereNull("r.hidden_at")
    .groupBy("s.id", "r.id")
    .orderBy(["r.title", "r.id", "s.start_ms"]);
  return (rows as Record<string, never>[]).map((row) => ({
    id: row.id,
    title: row.title,
    recordingId: row.recording_id,
    recordingTitle: row.recording_title,
    startMs: row.start_ms,
    endMs: row.end_ms,
    questions: row.questions,
  })) as unknown as AvailableStep[];
}

export type RevisionListItem = { number: number; publishedAt: Date; publishedBy: string; workChanged: boolean; contentHash: string };

export async function listRevisions(db: Db, organisationId: string, moduleId: string): Promise<RevisionListItem[]> {
  const rows = await db("module_revisions as r")
    .join("people as p", "p.id", "r.published_by")
    .select("r.number", "r.published_at", "p.name", "r.work_changed", "r.content_hash")
    .where({ "r.organisation_id": organisationId, "r.module_id": moduleId })
    .orderBy("r.number", "desc");
  return rows.map((row) => ({
    number: row.number,
    publishedAt: row.published_at,
    publishedBy: row.name,
    workChanged: row.work_changed,
    contentHash: row.content_hash,
  }));
}

export type ModuleHolder = {
  assignmentId: string;
  apprenticeId: string;
  name: string;
  revisionNumber: number;
  dueOn: string;
  knowledgeMetAt: Date | null;
  answered: number;
  right: number;
};

/** Who holds the module, and how many of its questions they last answered right. */
export async function listModuleHolders(db: Db, organisationId: string, moduleId: string): Promise<ModuleHolder[]> {
  const { rows } = await db.raw(
    `SELECT a.id, a.apprentice_id, p.name, r.number, a.due_on, a.knowledge_met_at,
       count(l.question_id) AS answered, count(l.question_id) FILTER (WHERE l.is_right) AS correct
     FROM assignments a
     JOIN people p ON p.id = a.apprentice_id
     JOIN module_revisions r ON r.id = a.module_revision_id
     LEFT JOIN (
       SELECT DISTINCT ON (assignment_id, question_id) assignment_id, question_id, is_right
       FROM answers ORDER BY assignment_id, question_id, answered_at DESC) l ON l.assignment_id = a.id
     WHERE a.organisation_id = ? AND a.module_id = ? AND a.withdrawn_at IS NULL
     GROUP BY a.id, p.name, r.number
     ORDER BY p.name`,
    [organisationId, moduleId],
  );
  return rows.map((row: Record<string, never>) => ({
    assignmentId: row.id,
    apprenticeId: row.apprentice_id,
    name: row.name,
    revisionNumber: row.number,
    dueOn: row.due_on,
    knowledgeMetAt: row.knowledge_met_at,
    answered: row.answered,
    right: row.correct,
  }));
}

/** For each question of a module, first answers and how many of them were right, whatever the revision. */
export async function countFirstAnswers(db: Db, organisationId: string, moduleId: string): Promise<Map<string, { answers: number; right: number }>> {
  const rows = await db("answers as n")
    .join("question_attempts as t", "t.id", "n.attempt_id")
    .join("assignments as a", "a.id", "n.assignment_id")
    .select("n.question_id")
    .count("* as answers")
    .select(db.raw("count(*) FILTER (WHERE n.is_right) AS correct"))
    .where({ "a.organisation_id": organisationId, "a.module_id": moduleId, "t.number": 1 })
    .groupBy("n.question_id");
  return new Map((rows as unknown as { question_id: string; answers: number; correct: number }[]).map((row) => [row.question_id, { answers: row.answers, right: row.correct }]));
}
