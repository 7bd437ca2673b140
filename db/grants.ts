import type { Knex } from "knex";

type Privilege = "SELECT" | "INSERT" | "UPDATE" | "DELETE";

const READ_WRITE: Privilege[] = ["SELECT", "INSERT", "UPDATE", "DELETE"];
const NO_DELETE: Privilege[] = ["SELECT", "INSERT", "UPDATE"];
/** What must never change: the application's role can add and read there, and nothing more. */
const WRITE_ONCE: Privilege[] = ["SELECT", "INSERT"];

/** What the application's role may do, table by table. A table without a row here is closed to it; a test asks for the row. */
export const GRANTS: Record<string, Privilege[]> = {
  organisations: ["SELECT", "INSERT"],
  people: NO_DELETE,
  memberships: NO_DELETE,
  invitations: NO_DELETE,
  password_resets: NO_DELETE,
  sessions: READ_WRITE,
  rate_limits: READ_WRITE,
  training_agreements: NO_DELETE,
  cohorts: NO_DELETE,
  cohort_members: ["SELECT", "INSERT", "DELETE"],
  vehicles: NO_DELETE,
  job_cards: NO_DELETE,
  instruments: NO_DELETE,
  licences: NO_DELETE,
  files: READ_WRITE,
  uploads: READ_WRITE,
  recordings: NO_DELETE,
  recording_stages: READ_WRITE,
  renditions: READ_WRITE,
  captions: READ_WRITE,
  steps: READ_WRITE,
  questions: READ_WRITE,
  tasks: NO_DELETE,
  task_revisions: WRITE_ONCE,
  modules: NO_DELETE,
  module_steps: READ_WRITE,
  module_tasks: READ_WRITE,
  module_revisions: WRITE_ONCE,
  module_revision_tasks: WRITE_ONCE,
  module_revision_recordings: WRITE_ONCE,
  assignments: NO_DELETE,
  played_spans: NO_DELETE,
  play_clocks: NO_DELETE,
  question_attempts: WRITE_ONCE,
  answers: WRITE_ONCE,
  practice_runs: NO_DELETE,
  evidence: NO_DELETE,
  readiness: NO_DELETE,
  observations: NO_DELETE,
  observation_marks: NO_DELETE,
  ledger_entries: WRITE_ONCE,
  erasable_values: ["SELECT", "INSERT", "DELETE"],
  sign_offs: WRITE_ONCE,
  sign_off_changes: WRITE_ONCE,
  mail_outbox: NO_DELETE,
};

/**
 * Gives the application's role exactly what GRANTS says and nothing else. Run after every migration, by the owner.
 * @param role  name of the application's database role; it must exist.
 */
export async function applyGrants(knex: Knex, role: string): Promise<void> {
  await knex.raw(`REVOKE ALL ON ALL TABLES IN SCHEMA public FROM ??`, [role]);
  await knex.raw(`GRANT USAGE ON SCHEMA public TO ??`, [role]);
  for (const [table, privileges] of Object.entries(GRANTS)) {
    await knex.raw(`GRANT ${privileges.join(", ")} ON ?? TO ??`, [table, role]);
  }
}
