import type { Knex } from "knex";

/** Uploads, files in the store, recordings with their processing, and the marking out: steps and questions. */
export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    CREATE TABLE files (
      id uuid PRIMARY KEY DEFAULT uuid_v7(),
      organisation_id uuid NOT NULL REFERENCES organisations ON DELETE RESTRICT,
      store_key text NOT NULL UNIQUE CHECK (char_length(store_key) BETWEEN 1 AND 900),
      media_type text NOT NULL,
      size_bytes bigint NOT NULL CHECK (size_bytes >= 0),
      sha256 text CHECK (sha256 ~ '^[0-9a-f]{64}$'),
      created_by uuid REFERENCES people ON DELETE RESTRICT,
      created_at timestamptz NOT NULL DEFAULT now(),
      UNIQUE (organisation_id, id)
    );

    CREATE TABLE uploads (
      id uuid PRIMARY KEY DEFAULT uuid_v7(),
      organisation_id uuid NOT NULL REFERENCES organisations ON DELETE RESTRICT,
      person_id uuid NOT NULL REFERENCES people ON DELETE RESTRICT,
      purpose text NOT NULL CHECK (purpose IN ('recording', 'evidence')),
      file_name text NOT NULL CHECK (char_length(file_name) BETWEEN 1 AND 255),
      media_type text NOT NULL,
      size_bytes bigint NOT NULL CHECK (size_bytes > 0),
      modified_ms bigint NOT NULL,
      store_key text NOT NULL UNIQUE,
      store_upload_id text NOT NULL,
      part_size_bytes integer NOT NULL CHECK (part_size_bytes > 0),
      state text NOT NULL DEFAULT 'open' CHECK (state IN ('open', 'completed', 'aborted')),
      created_at timestamptz NOT NULL DEFAULT now(),
      ended_at timestamptz,
      CHECK ((state = 'open') = (ended_at IS NULL)),
      UNIQUE (organisation_id, id)
    );
    CREATE INDEX uploads_person_idx ON uploads (organisation_id, person_id) WHERE state = 'open';

    CREATE TABLE recordings (
      id uuid PRIMARY KEY DEFAULT uuid_v7(),
      organisation_id uuid NOT NULL REFERENCES organisations ON DELETE RESTRICT,
      title text NOT NULL CHECK (char_length(title) BETWEEN 1 AND 200),
      vehicle_id uuid,
      recorded_by uuid NOT NULL REFERENCES people ON DELETE RESTRICT,
      upload_id uuid UNIQUE,
      source_file_id uuid NOT NULL,
      state text NOT NULL DEFAULT 'processing' CHECK (state IN ('processing', 'ready', 'failed')),
      failure text,
      duration_ms integer CHECK (duration_ms > 0),
      width integer CHECK (width > 0),
      height integer CHECK (height > 0),
      has_sound boolean,
      -- An edit list over the source's own axis, so that no time in any step, caption or span ever moves.
      edit_list jsonb NOT NULL DEFAULT '[]' CHECK (jsonb_typeof(edit_list) = 'array'),
      consent text CHECK (consent IN ('nobody_in_shot', 'consent_given')),
      consent_note text NOT NULL DEFAULT '',
      private_details_checked_at timestamptz,
      private_details_checked_by uuid REFERENCES people ON DELETE RESTRICT,
      marking_version integer NOT NULL DEFAULT 0,
      marking_saved_at timestamptz,
      marking_saved_by uuid REFERENCES people ON DELETE RESTRICT,
      hidden_at timestamptz,
      created_at timestamptz NOT NULL DEFAULT now(),
      UNIQUE (organisation_id, id),
      FOREIGN KEY (organisation_id, vehicle_id) REFERENCES vehicles (organisation_id, id) ON DELETE RESTRICT,
      FOREIGN KEY (organisation_id, upload_id) REFERENCES uploads (organisation_id, id) ON DELETE RESTRICT,
      FOREIGN KEY (organisation_id, source_file_id) REFERENCES files (organisation_id, id) ON DELETE RESTRICT,
      CHECK ((state = 'ready') <= (duration_ms IS NOT NULL)),
      CHECK ((state = 'failed') = (failure IS NOT NULL))
    );
    CREATE INDEX recordings_organisation_idx ON recordings (organisation_id, created_at DESC);

    CREATE TABLE recording_stages (
      recording_id uuid NOT NULL REFERENCES recordings ON DELETE CASCADE,
      stage text NOT NULL CHECK (stage IN ('probe', '480p', '720p', 'poster', 'storyboard')),
      state text NOT NULL DEFAULT 'waiting' CHECK (state IN ('waiting', 'running', 'done', 'failed')),
      percent smallint NOT NULL DEFAULT 0 CHECK (percent BETWEEN 0 AND 100),
      attempt integer NOT NULL DEFAULT 0 CHECK (attempt >= 0),
      -- Whoever works on a stage holds it until here and moves it on while alive; past it, another may take over.
      lease_until timestamptz,
      started_at timestamptz,
      finished_at timestamptz,
      failure text,
      PRIMARY KEY (recording_id, stage)
    );

    CREATE TABLE renditions (
      organisation_id uuid NOT NULL,
      recording_id uuid NOT NULL,
      kind text NOT NULL CHECK (kind IN ('480p', '720p', 'poster', 'storyboard_sheet', 'storyboard_track')),
      file_id uuid NOT NULL,
      width integer CHECK (width > 0),
      height integer CHECK (height > 0),
      PRIMARY KEY (recording_id, kind),
      FOREIGN KEY (organisation_id, recording_id) REFERENCES recordings (organisation_id, id) ON DELETE CASCADE,
      FOREIGN KEY (organisation_id, file_id) REFERENCES files (organisation_id, id) ON DELETE RESTRICT
    );

    CREATE TABLE captions (
      recording_id uuid NOT NULL REFERENCES recordings ON DELETE CASCADE,
      language text NOT NULL DEFAULT 'en' CHECK (language ~ '^[a-z]{2,3}(-[A-Za-z0-9]{2,8})*$'),
      vtt text NOT NULL CHECK (vtt LIKE 'WEBVTT%'),
      updated_at timestamptz NOT NULL DEFAULT now(),
      PRIMARY KEY (recording_id, language)
    );

    CREATE TABLE steps (
      id uuid PRIMARY KEY DEFAULT uuid_v7(),
      organisation_id uuid NOT NULL,
      recording_id uuid NOT NULL,
      title text NOT NULL CHECK (char_length(title) BETWEEN 1 AND 200),
      start_ms integer NOT NULL CHECK (start_ms >= 0),
      end_ms integer NOT NULL CHECK (end_ms > start_ms),
      facts jsonb NOT NULL CHECK (jsonb_typeof(facts) = 'object'),
      created_at timestamptz NOT NULL DEFAULT now(),
      UNIQUE (recording_id, id),
      UNIQUE (organisation_id, id),
      FOREIGN KEY (organisation_id, recording_id) REFERENCES recordings (organisation_id, id) ON DELETE CASCADE,
      CONSTRAINT steps_no_overlap
        EXCLUDE USING gist (recording_id WITH =, int4range(start_ms, end_ms) WITH &&) DEFERRABLE INITIALLY DEFERRED
    );

    CREATE TABLE questions (
      id uuid PRIMARY KEY DEFAULT uuid_v7(),
      recording_id uuid NOT NULL,
      step_id uuid NOT NULL,
      at_ms integer NOT NULL CHECK (at_ms >= 0),
      kind text NOT NULL CHECK (kind IN ('one_of', 'number', 'put_in_order')),
      prompt text NOT NULL CHECK (char_length(prompt) BETWEEN 1 AND 500),
      explanation text NOT NULL DEFAULT '' CHECK (char_length(explanation) <= 1000),
      look_again_ms integer NOT NULL CHECK (look_again_ms >= 0),
      safety_critical boolean NOT NULL DEFAULT false,
      body jsonb NOT NULL,
      created_at timestamptz NOT NULL DEFAULT now(),
      CHECK (body ->> 'kind' = kind),
      FOREIGN KEY (recording_id, step_id) REFERENCES steps (recording_id, id) ON DELETE CASCADE DEFERRABLE INITIALLY DEFERRED
    );
    CREATE INDEX questions_recording_idx ON questions (recording_id, at_ms);
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw(
    `DROP TABLE questions, steps, captions, renditions, recording_stages, recordings, uploads, files`,
  );
}
