import type { Knex } from "knex";

/** Organisations, people (global), memberships, and what signing in needs. */
export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    CREATE TABLE organisations (
      id uuid PRIMARY KEY DEFAULT uuid_v7(),
      slug text NOT NULL UNIQUE CHECK (slug ~ '^[a-z0-9][a-z0-9-]{1,38}$'),
      name text NOT NULL CHECK (char_length(name) BETWEEN 1 AND 120),
      kind text NOT NULL CHECK (kind IN ('workshop', 'college')),
      is_demo boolean NOT NULL DEFAULT false,
      created_at timestamptz NOT NULL DEFAULT now(),
      UNIQUE (id, kind)
    );

    CREATE TABLE people (
      id uuid PRIMARY KEY DEFAULT uuid_v7(),
      name text NOT NULL CHECK (char_length(name) BETWEEN 1 AND 120),
      email text NOT NULL CHECK (email = lower(email) AND email LIKE '%_@_%' AND char_length(email) <= 254),
      password_hash text,
      date_of_birth date,
      suspended_at timestamptz,
      created_at timestamptz NOT NULL DEFAULT now()
    );
    CREATE UNIQUE INDEX people_email_key ON people (email);

    CREATE TABLE memberships (
      id uuid PRIMARY KEY DEFAULT uuid_v7(),
      organisation_id uuid NOT NULL REFERENCES organisations ON DELETE RESTRICT,
      person_id uuid NOT NULL REFERENCES people ON DELETE RESTRICT,
      roles text[] NOT NULL CHECK (
        cardinality(roles) > 0
        AND roles <@ ARRAY['mentor', 'apprentice', 'assessor', 'liaison', 'manager', 'verifier']),
      joined_at timestamptz NOT NULL DEFAULT now(),
      ended_at timestamptz CHECK (ended_at >= joined_at)
    );
    CREATE UNIQUE INDEX memberships_one_open ON memberships (organisation_id, person_id) WHERE ended_at IS NULL;
    CREATE INDEX memberships_person_idx ON memberships (person_id);

    -- A person joins only by accepting one of these. invited_by is null for the first manager, who is invited by a command.
    CREATE TABLE invitations (
      id uuid PRIMARY KEY DEFAULT uuid_v7(),
      organisation_id uuid NOT NULL REFERENCES organisations ON DELETE RESTRICT,
      name text NOT NULL CHECK (char_length(name) BETWEEN 1 AND 120),
      email text NOT NULL CHECK (email = lower(email)),
      roles text[] NOT NULL CHECK (
        cardinality(roles) > 0
        AND roles <@ ARRAY['mentor', 'apprentice', 'assessor', 'liaison', 'manager', 'verifier']),
      token_hash text NOT NULL UNIQUE CHECK (token_hash ~ '^[0-9a-f]{64}$'),
      invited_by uuid REFERENCES people ON DELETE RESTRICT,
      created_at timestamptz NOT NULL DEFAULT now(),
      expires_at timestamptz NOT NULL,
      accepted_at timestamptz,
      accepted_by uuid REFERENCES people ON DELETE RESTRICT,
      withdrawn_at timestamptz,
      CHECK ((accepted_at IS NULL) = (accepted_by IS NULL))
    );
    CREATE INDEX invitations_organisation_idx ON invitations (organisation_id, created_at);

    CREATE TABLE password_resets (
      id uuid PRIMARY KEY DEFAULT uuid_v7(),
      person_id uuid NOT NULL REFERENCES people ON DELETE CASCADE,
      token_hash text NOT NULL UNIQUE CHECK (token_hash ~ '^[0-9a-f]{64}$'),
      created_at timestamptz NOT NULL DEFAULT now(),
      expires_at timestamptz NOT NULL,
      used_at timestamptz
    );

    -- The cookie only names one of these rows; a row that has ended ends the sign-in at the next request.
    CREATE TABLE sessions (
      id uuid PRIMARY KEY DEFAULT uuid_v7(),
      person_id uuid NOT NULL REFERENCES people ON DELETE CASCADE,
      created_at timestamptz NOT NULL DEFAULT now(),
      last_seen_at timestamptz NOT NULL DEFAULT now(),
      expires_at timestamptz NOT NULL,
      ended_at timestamptz,
      device text NOT NULL DEFAULT '' CHECK (char_length(device) <= 200)
    );
    CREATE INDEX sessions_person_idx ON sessions (person_id) WHERE ended_at IS NULL;

    CREATE TABLE rate_limits (
      key text NOT NULL,
      window_start timestamptz NOT NULL,
      count integer NOT NULL DEFAULT 1 CHECK (count > 0),
      PRIMARY KEY (key, window_start)
    );
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw(`DROP TABLE rate_limits, sessions, password_resets, invitations, memberships, people, organisations`);
}
