import type { Db } from "@/db/client";

export type LetterReader = { name: string; email: string };

/** Mentors of a workshop who gave the apprentice a module that opens the task; every mentor there where none did. */
export async function listMentorsConcerned(
  db: Db,
  of: { workshopId: string; apprenticeId: string; taskId: string },
): Promise<LetterReader[]> {
  const { rows } = await db.raw(
    `WITH mentors AS (
       SELECT p.id, p.name, p.email, EXISTS (
         SELECT 1 FROM assignments a JOIN module_revision_tasks t ON t.module_revision_id = a.module_revision_id
         WHERE a.assigned_by = p.id AND a.apprentice_id = :apprenticeId AND t.task_id = :taskId) AS gave
       FROM memberships m JOIN people p ON p.id = m.person_id
       WHERE m.organisation_id = :workshopId AND m.ended_at IS NULL AND 'mentor' = ANY(m.roles) AND p.suspended_at IS NULL)
     SELECT name, email FROM mentors WHERE gave OR NOT EXISTS (SELECT 1 FROM mentors WHERE gave) ORDER BY name`,
    of,
  );
  return rows;
}

export async function findReader(db: Db, personId: string): Promise<LetterReader | undefined> {
  return db("people").select("name", "email").where({ id: personId }).first();
}
