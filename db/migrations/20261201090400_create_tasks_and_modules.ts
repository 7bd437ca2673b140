import type { Knex } from "knex";

/** Tasks and modules with their frozen revisions, what was given to whom, what was played and answered. */
export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    CREATE TABLE tasks (
      id uuid PRIMARY KEY DEFAULT uuid_v7(),
      organisation_id uuid NOT NULL REFERENCES organisations ON DELETE RESTRICT,
      draft jsonb NOT NULL CHECK (jsonb_typeof(draft) = 'object'),
      created_by uuid NOT NULL REFERENCES people ON DELETE RESTRICT,
      created_at timestamptz NOT NULL DEFAULT now(),
      retired_at timestamptz,
      UNIQUE (organisation_id, id)
    );

    CREATE TABLE task_revisions (
      id uuid PRIMARY KEY DEFAULT uuid_v7(),
      organisation_id uuid NOT NULL,
      task_id uuid NOT NULL,
      number integer NOT NULL CHECK (number > 0),
      content jsonb NOT NULL CHECK (jsonb_typeof(content) = 'object'),
      content_hash text NOT NULL CHECK (content_hash ~ '^[0-9a-f]{64}$'),
      work_changed boolean NOT NULL,
      published_by uuid NOT NULL REFERENCES people ON DELETE RESTRICT,
      published_at timestamptz NOT NULL DEFAULT now(),
      UNIQUE (task_id, number),
      UNIQUE (task_id, id),
      FOREIGN KEY (organisation_id, task_id) REFERENCES tasks (organisation_id, id) ON DELETE RESTRICT
    );

    CREATE TABLE modules (
      id uuid PRIMARY KEY DEFAULT uuid_v7(),
      organisation_id uuid NOT NULL REFERENCES organisations ON DELETE RESTRICT,
      title text NOT NULL CHECK (char_length(title) BETWEEN 1 AND 200),
      summary text NOT NULL DEFAULT '' CHECK (char_length(summary) <= 2000),
      pass_share numeric(4, 3) NOT NULL CHECK (pass_share BETWEEN 0 AND 1),
      version integer NOT NULL DEFAULT 1,
      created_by uuid NOT NULL REFERENCES people ON DELETE RESTRICT,
      created_at timestamptz NOT NULL DEFAULT now(),
      retired_at timestamptz,
      UNIQUE (organisation_id, id)
    );
    CREATE TABLE module_steps (
      organisation_id uuid NOT NULL,
      module_id uuid NOT NULL,
      step_id uuid NOT NULL,
      position integer NOT NULL CHECK (position >= 0),
      PRIMARY KEY (module_id, step_id),
      CONSTRAINT module_steps_position UNIQUE (module_id, position) DEFERRABLE INITIALLY DEFERRED,
      FOREIGN KEY (organisation_id, module_id) REFERENCES modules (organisation_id, id) ON DELETE CASCADE,
      FOREIGN KEY (organisation_id, step_id) REFERENCES steps (organisation_id, id) ON DELETE CASCADE
    );
    -- A task may belong to the college that the workshop shares an apprentice with: the policy decides, so no composite key here.
    CREATE TABLE module_tasks (
      organisation_id uuid NOT NULL,
      module_id uuid NOT NULL,
      task_id uuid NOT NULL REFERENCES tasks ON DELETE RESTRICT,
      PRIMARY KEY (module_id, task_id),
      FOREIGN KEY (organisation_id, module_id) REFERENCES modules (organisation_id, id) ON DELETE CASCADE
    );

    CREATE TABLE module_revisions (
      id uuid PRIMARY KEY DEFAULT uuid_v7(),
      organisation_id uuid NOT NULL,
      module_id uuid NOT NULL,
      number integer NOT NULL CHECK (number > 0),
      content jsonb NOT NULL CHECK (jsonb_typeof(content) = 'object'),
      content_hash text NOT NULL CHECK (content_hash ~ '^[0-9a-f]{64}$'),
      work_changed boolean NOT NULL,
      published_by uuid NOT NULL REFERENCES people ON DELETE RESTRICT,
      published_at timestamptz NOT NULL DEFAULT now(),
      UNIQUE (module_id, number),
      UNIQUE (organisation_id, id),
      UNIQUE (organisation_id, module_id, id),
      FOREIGN KEY (organisation_id, module_id) REFERENCES modules (organisation_id, id) ON DELETE RESTRICT
    );
    CREATE TABLE module_revision_tasks (
      module_revision_id uuid NOT NULL REFERENCES module_revisions ON DELETE RESTRICT,
      task_id uuid NOT NULL REFERENCES tasks ON DELETE RESTRICT,
      PRIMARY KEY (module_revision_id, task_id)
    );
    CREATE INDEX module_revision_tasks_task_idx ON module_revision_tasks (task_id);
    -- Which recordings a revision plays, so that hiding a recording finds what stands on it.
    CREATE TABLE module_revision_recordings (
      organisation_id uuid NOT NULL,
      module_revision_id uuid NOT NULL,
      recording_id uuid NOT NULL,
      PRIMARY KEY (module_revision_id, recording_id),
      FOREIGN KEY (organisation_id, module_revision_id) REFERENCES module_revisions (organisation_id, id) ON DELETE RESTRICT,
      FOREIGN KEY (organisation_id, recording_id) REFERENCES recordings (organisation_id, id) ON DELETE RESTRICT
    );

    CREATE TABLE assignments (
      id uuid PRIMARY KEY DEFAULT uuid_v7(),
      organisation_id uuid NOT NULL,
      module_id uuid NOT NULL,
      module_revision_id uuid NOT NULL,
      apprentice_id uuid NOT NULL REFERENCES people ON DELETE RESTRICT,
      assigned_by uuid NOT NULL REFERENCES people ON DELETE RESTRICT,
      due_on date NOT NULL,
      created_at timestamptz NOT NULL DEFAULT now(),
      withdrawn_at timestamptz,
      -- Set once, by the server, when the knowledge rule is first met.
      knowledge_met_at timestamptz,
      UNIQUE (organisation_id, id),
      FOREIGN KEY (organisation_id, module_id, module_revision_id)
        REFERENCES module_revisions (organisation_id, module_id, id) ON DELETE RESTRICT
    );
    CREATE UNIQUE INDEX assignments_one_open ON assignments (module_revision_id, apprentice_id) WHERE withdrawn_at IS NULL;
    CREATE INDEX assignments_apprentice_idx ON assignments (apprentice_id);

    -- Played spans the server accepted, united: the database unites, so the same part never counts twice.
    CREATE TABLE played_spans (
      assignment_id uuid NOT NULL REFERENCES assignments ON DELETE CASCADE,
      recording_id uuid NOT NULL REFERENCES recordings ON DELETE RESTRICT,
      played int4multirange NOT NULL DEFAULT '{}',
      updated_at timestamptz NOT NULL DEFAULT now(),
      PRIMARY KEY (assignment_id, recording_id)
    );
    -- One clock per person, not per tab: two tabs or devices at once do not add up.
    CREATE TABLE play_clocks (
      person_id uuid PRIMARY KEY REFERENCES people ON DELETE CASCADE,
      last_report_at timestamptz NOT NULL
    );

    CREATE TABLE question_attempts (
      id uuid PRIMARY KEY DEFAULT uuid_v7(),
      organisation_id uuid NOT NULL,
      assignment_id uuid NOT NULL,
      question_id uuid NOT NULL,
      number integer NOT NULL CHECK (number > 0),
      -- From this attempt's random ids to the question's own. Never leaves the server.
      id_map jsonb NOT NULL CHECK (jsonb_typeof(id_map) = 'object'),
      issued_at timestamptz NOT NULL DEFAULT now(),
      UNIQUE (assignment_id, question_id, number),
      UNIQUE (organisation_id, id),
      FOREIGN KEY (organisation_id, assignment_id) REFERENCES assignments (organisation_id, id) ON DELETE RESTRICT
    );
    CREATE TABLE answers (
      attempt_id uuid PRIMARY KEY,
      organisation_id uuid NOT NULL,
      assignment_id uuid NOT NULL,
      question_id uuid NOT NULL,
      given jsonb NOT NULL,
      is_right boolean NOT NULL,
      diagnosis text,
      answered_at timestamptz NOT NULL DEFAULT now(),
      FOREIGN KEY (organisation_id, attempt_id) REFERENCES question_attempts (organisation_id, id) ON DELETE RESTRICT,
      FOREIGN KEY (organisation_id, assignment_id) REFERENCES assignments (organisation_id, id) ON DELETE RESTRICT
    );
    CREATE INDEX answers_assignment_idx ON answers (assignment_id, question_id, answered_at);
  `);
  for (const table of ["task_revisions", "module_revisions", "module_revision_tasks", "module_revision_recordings", "answers"]) {
    await knex.raw(`
      CREATE TRIGGER ${table}_written_once BEFORE UPDATE OR DELETE OR TRUNCATE ON ${table}
      FOR EACH STATEMENT EXECUTE FUNCTION refuse_change()`);
  }
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw(`
    DROP TABLE answers, question_attempts, play_clocks, played_spans, assignments, module_revision_recordings,
      module_revision_tasks, module_revisions, module_tasks, module_steps, modules, task_revisions, tasks`);
}
