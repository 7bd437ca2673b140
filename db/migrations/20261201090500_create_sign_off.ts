import type { Knex } from "knex";

/** Practice, evidence, readiness, observations, and what stands for good: ledger entries and sign-offs. */
export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    CREATE TABLE practice_runs (
      id uuid PRIMARY KEY DEFAULT uuid_v7(),
      organisation_id uuid NOT NULL REFERENCES organisations ON DELETE RESTRICT,
      apprentice_id uuid NOT NULL REFERENCES people ON DELETE RESTRICT,
      task_id uuid NOT NULL REFERENCES tasks ON DELETE RESTRICT,
      done_on date NOT NULL,
      vehicle text NOT NULL CHECK (char_length(vehicle) BETWEEN 1 AND 120),
      job_card_number text NOT NULL DEFAULT '' CHECK (char_length(job_card_number) <= 40),
      minutes integer NOT NULL CHECK (minutes BETWEEN 1 AND 1440),
      note text NOT NULL DEFAULT '' CHECK (char_length(note) <= 1000),
      confirmed_by uuid REFERENCES people ON DELETE RESTRICT,
      confirmed_at timestamptz,
      idempotency_key uuid NOT NULL UNIQUE DEFAULT gen_random_uuid(),
      created_at timestamptz NOT NULL DEFAULT now(),
      CHECK ((confirmed_by IS NULL) = (confirmed_at IS NULL)),
      CHECK (confirmed_by <> apprentice_id)
    );
    CREATE INDEX practice_runs_apprentice_idx ON practice_runs (apprentice_id, task_id);

    CREATE TABLE evidence (
      id uuid PRIMARY KEY DEFAULT uuid_v7(),
      organisation_id uuid NOT NULL,
      apprentice_id uuid NOT NULL REFERENCES people ON DELETE RESTRICT,
      task_id uuid NOT NULL REFERENCES tasks ON DELETE RESTRICT,
      kind text NOT NULL CHECK (kind IN ('photo')),
      file_id uuid NOT NULL UNIQUE,
      note text NOT NULL DEFAULT '' CHECK (char_length(note) <= 500),
      created_at timestamptz NOT NULL DEFAULT now(),
      removed_at timestamptz,
      FOREIGN KEY (organisation_id, file_id) REFERENCES files (organisation_id, id) ON DELETE RESTRICT
    );
    CREATE INDEX evidence_apprentice_idx ON evidence (apprentice_id, task_id);

    -- "I am ready to be seen": open until observed or taken back, one at a time.
    CREATE TABLE readiness (
      id uuid PRIMARY KEY DEFAULT uuid_v7(),
      organisation_id uuid NOT NULL REFERENCES organisations ON DELETE RESTRICT,
      apprentice_id uuid NOT NULL REFERENCES people ON DELETE RESTRICT,
      task_id uuid NOT NULL REFERENCES tasks ON DELETE RESTRICT,
      declared_at timestamptz NOT NULL DEFAULT now(),
      booked_for timestamptz,
      booked_by uuid REFERENCES people ON DELETE RESTRICT,
      ended_at timestamptz,
      ended_because text CHECK (ended_because IN ('taken_back', 'observed')),
      CHECK ((ended_at IS NULL) = (ended_because IS NULL)),
      CHECK ((booked_for IS NULL) = (booked_by IS NULL))
    );
    CREATE UNIQUE INDEX readiness_one_open ON readiness (apprentice_id, task_id) WHERE ended_at IS NULL;

    -- organisation_id is the assessor's; the apprentice's workshop at that time stands beside it.
    CREATE TABLE observations (
      id uuid PRIMARY KEY DEFAULT uuid_v7(),
      organisation_id uuid NOT NULL REFERENCES organisations ON DELETE RESTRICT,
      apprentice_id uuid NOT NULL REFERENCES people ON DELETE RESTRICT,
      workshop_id uuid NOT NULL REFERENCES organisations ON DELETE RESTRICT,
      assessor_id uuid NOT NULL REFERENCES people ON DELETE RESTRICT,
      task_id uuid NOT NULL,
      task_revision_id uuid NOT NULL,
      vehicle text NOT NULL CHECK (char_length(vehicle) BETWEEN 1 AND 120),
      job_card_number text NOT NULL CHECK (char_length(job_card_number) BETWEEN 1 AND 40),
      state text NOT NULL DEFAULT 'open' CHECK (state IN ('open', 'signed', 'dropped')),
      stopped_reason text CHECK (char_length(stopped_reason) BETWEEN 1 AND 500),
      started_at timestamptz NOT NULL DEFAULT now(),
      ended_at timestamptz,
      idempotency_key uuid NOT NULL UNIQUE,
      CHECK (assessor_id <> apprentice_id),
      CHECK ((state = 'open') = (ended_at IS NULL)),
      UNIQUE (organisation_id, id),
      FOREIGN KEY (task_id, task_revision_id) REFERENCES task_revisions (task_id, id) ON DELETE RESTRICT
    );
    CREATE UNIQUE INDEX observations_one_open ON observations (apprentice_id, task_id, assessor_id) WHERE state = 'open';
    CREATE INDEX observations_apprentice_idx ON observations (apprentice_id, task_id);

    CREATE TABLE observation_marks (
      organisation_id uuid NOT NULL,
      observation_id uuid NOT NULL,
      criterion_key text NOT NULL CHECK (char_length(criterion_key) BETWEEN 1 AND 40),
      mark text CHECK (mark IN ('met', 'not_yet', 'not_seen')),
      reading_value numeric,
      reading_unit text,
      instrument_id uuid REFERENCES instruments ON DELETE RESTRICT,
      prompts smallint NOT NULL DEFAULT 0 CHECK (prompts BETWEEN 0 AND 99),
      remark text NOT NULL DEFAULT '' CHECK (char_length(remark) <= 500),
      updated_at timestamptz NOT NULL DEFAULT now(),
      PRIMARY KEY (observation_id, criterion_key),
      CHECK ((reading_value IS NULL) = (reading_unit IS NULL)),
      FOREIGN KEY (organisation_id, observation_id) REFERENCES observations (organisation_id, id) ON DELETE CASCADE
    );

    -- Leaves of each organisation's tree, numbered from 0 without a gap under that organisation's advisory lock.
    CREATE TABLE ledger_entries (
      organisation_id uuid NOT NULL REFERENCES organisations ON DELETE RESTRICT,
      leaf_index bigint NOT NULL CHECK (leaf_index >= 0),
      kind text NOT NULL CHECK (kind IN ('sign_off', 'correction', 'withdrawal', 'module_revision', 'task_revision')),
      canonical text NOT NULL,
      leaf_hash text NOT NULL CHECK (leaf_hash ~ '^[0-9a-f]{64}$'),
      recorded_at timestamptz NOT NULL DEFAULT now(),
      PRIMARY KEY (organisation_id, leaf_index),
      UNIQUE (organisation_id, leaf_hash)
    );

    -- Personal values behind the ledger's salted hashes. Deleting a row erases the value; the entry still proves itself.
    CREATE TABLE erasable_values (
      id uuid PRIMARY KEY DEFAULT uuid_v7(),
      person_id uuid NOT NULL REFERENCES people ON DELETE RESTRICT,
      organisation_id uuid NOT NULL,
      leaf_index bigint NOT NULL,
      label text NOT NULL CHECK (char_length(label) BETWEEN 1 AND 40),
      value text NOT NULL,
      salt text NOT NULL CHECK (salt ~ '^[0-9a-f]{32,}$'),
      UNIQUE (organisation_id, leaf_index, label),
      FOREIGN KEY (organisation_id, leaf_index) REFERENCES ledger_entries (organisation_id, leaf_index) ON DELETE RESTRICT
    );
    CREATE INDEX erasable_values_person_idx ON erasable_values (person_id);

    CREATE TABLE sign_offs (
      id uuid PRIMARY KEY DEFAULT uuid_v7(),
      organisation_id uuid NOT NULL,
      observation_id uuid NOT NULL UNIQUE,
      apprentice_id uuid NOT NULL REFERENCES people ON DELETE RESTRICT,
      workshop_id uuid NOT NULL REFERENCES organisations ON DELETE RESTRICT,
      assessor_id uuid NOT NULL REFERENCES people ON DELETE RESTRICT,
      task_id uuid NOT NULL,
      task_revision_id uuid NOT NULL,
      outcome text NOT NULL CHECK (outcome IN ('met', 'not_yet')),
      level smallint CHECK (level BETWEEN 1 AND 5),
      feedback text NOT NULL DEFAULT '' CHECK (char_length(feedback) <= 1000),
      -- The computed outcome as it was shown: reasons criterion by criterion, and each cap on the level.
      reasons jsonb NOT NULL,
      signed_at timestamptz NOT NULL DEFAULT now(),
      current_until date,
      leaf_index bigint NOT NULL,
      CHECK (assessor_id <> apprentice_id),
      CHECK ((outcome = 'met') = (level IS NOT NULL)),
      CHECK ((outcome = 'met') = (current_until IS NOT NULL)),
      UNIQUE (organisation_id, id),
      FOREIGN KEY (organisation_id, observation_id) REFERENCES observations (organisation_id, id) ON DELETE RESTRICT,
      FOREIGN KEY (task_id, task_revision_id) REFERENCES task_revisions (task_id, id) ON DELETE RESTRICT,
      FOREIGN KEY (organisation_id, leaf_index) REFERENCES ledger_entries (organisation_id, leaf_index) ON DELETE RESTRICT
    );
    CREATE INDEX sign_offs_apprentice_idx ON sign_offs (apprentice_id, task_id, signed_at);
    CREATE INDEX sign_offs_workshop_idx ON sign_offs (workshop_id, signed_at);

    CREATE TABLE sign_off_changes (
      id uuid PRIMARY KEY DEFAULT uuid_v7(),
      organisation_id uuid NOT NULL,
      sign_off_id uuid NOT NULL,
      kind text NOT NULL CHECK (kind IN ('correction', 'withdrawal')),
      reason text NOT NULL CHECK (char_length(reason) BETWEEN 1 AND 500),
      made_by uuid NOT NULL REFERENCES people ON DELETE RESTRICT,
      made_at timestamptz NOT NULL DEFAULT now(),
      leaf_index bigint NOT NULL,
      FOREIGN KEY (organisation_id, sign_off_id) REFERENCES sign_offs (organisation_id, id) ON DELETE RESTRICT,
      FOREIGN KEY (organisation_id, leaf_index) REFERENCES ledger_entries (organisation_id, leaf_index) ON DELETE RESTRICT
    );
    CREATE UNIQUE INDEX sign_off_changes_one_withdrawal ON sign_off_changes (sign_off_id) WHERE kind = 'withdrawal';
  `);
  for (const table of ["ledger_entries", "sign_offs", "sign_off_changes"]) {
    await knex.raw(`
      CREATE TRIGGER ${table}_written_once BEFORE UPDATE OR DELETE OR TRUNCATE ON ${table}
      FOR EACH STATEMENT EXECUTE FUNCTION refuse_change()`);
  }
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw(`
    DROP TABLE sign_off_changes, sign_offs, erasable_values, ledger_entries, observation_marks, observations,
      readiness, evidence, practice_runs`);
}
