import type { Knex } from "knex";

/** Training agreements and cohorts; the workshop's vehicles, job cards and instruments; licences that people hold. */
export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    -- The record of an apprentice is shared between exactly one workshop and one college at a time.
    CREATE TABLE training_agreements (
      id uuid PRIMARY KEY DEFAULT uuid_v7(),
      apprentice_id uuid NOT NULL REFERENCES people ON DELETE RESTRICT,
      workshop_id uuid NOT NULL,
      workshop_kind text NOT NULL DEFAULT 'workshop' CHECK (workshop_kind = 'workshop'),
      college_id uuid NOT NULL,
      college_kind text NOT NULL DEFAULT 'college' CHECK (college_kind = 'college'),
      qualification text NOT NULL CHECK (char_length(qualification) BETWEEN 1 AND 200),
      starts_on date NOT NULL,
      planned_end_on date NOT NULL,
      ends_on date,
      contracted_minutes integer NOT NULL CHECK (contracted_minutes >= 0),
      created_at timestamptz NOT NULL DEFAULT now(),
      FOREIGN KEY (workshop_id, workshop_kind) REFERENCES organisations (id, kind) ON DELETE RESTRICT,
      FOREIGN KEY (college_id, college_kind) REFERENCES organisations (id, kind) ON DELETE RESTRICT,
      CHECK (planned_end_on > starts_on),
      CHECK (ends_on >= starts_on),
      UNIQUE (id, college_id),
      CONSTRAINT training_agreements_one_at_a_time
        EXCLUDE USING gist (apprentice_id WITH =, daterange(starts_on, ends_on, '[]') WITH &&)
    );
    CREATE INDEX training_agreements_workshop_idx ON training_agreements (workshop_id, apprentice_id);
    CREATE INDEX training_agreements_college_idx ON training_agreements (college_id, apprentice_id);

    CREATE TABLE cohorts (
      id uuid PRIMARY KEY DEFAULT uuid_v7(),
      organisation_id uuid NOT NULL REFERENCES organisations ON DELETE RESTRICT,
      name text NOT NULL CHECK (char_length(name) BETWEEN 1 AND 120),
      starts_on date NOT NULL,
      created_at timestamptz NOT NULL DEFAULT now(),
      UNIQUE (organisation_id, id),
      UNIQUE (organisation_id, name)
    );
    CREATE TABLE cohort_members (
      organisation_id uuid NOT NULL,
      cohort_id uuid NOT NULL,
      agreement_id uuid NOT NULL,
      PRIMARY KEY (cohort_id, agreement_id),
      FOREIGN KEY (organisation_id, cohort_id) REFERENCES cohorts (organisation_id, id) ON DELETE CASCADE,
      FOREIGN KEY (agreement_id, organisation_id) REFERENCES training_agreements (id, college_id) ON DELETE CASCADE
    );

    CREATE TABLE vehicles (
      id uuid PRIMARY KEY DEFAULT uuid_v7(),
      organisation_id uuid NOT NULL REFERENCES organisations ON DELETE RESTRICT,
      label text NOT NULL CHECK (char_length(label) BETWEEN 1 AND 80),
      model text NOT NULL CHECK (char_length(model) BETWEEN 1 AND 120),
      created_at timestamptz NOT NULL DEFAULT now(),
      UNIQUE (organisation_id, id),
      UNIQUE (organisation_id, label)
    );
    CREATE TABLE job_cards (
      id uuid PRIMARY KEY DEFAULT uuid_v7(),
      organisation_id uuid NOT NULL,
      vehicle_id uuid NOT NULL,
      number text NOT NULL CHECK (char_length(number) BETWEEN 1 AND 40),
      title text NOT NULL CHECK (char_length(title) BETWEEN 1 AND 200),
      starts_at timestamptz NOT NULL,
      UNIQUE (organisation_id, id),
      UNIQUE (organisation_id, number),
      FOREIGN KEY (organisation_id, vehicle_id) REFERENCES vehicles (organisation_id, id) ON DELETE RESTRICT
    );

    CREATE TABLE instruments (
      id uuid PRIMARY KEY DEFAULT uuid_v7(),
      organisation_id uuid NOT NULL REFERENCES organisations ON DELETE RESTRICT,
      label text NOT NULL CHECK (char_length(label) BETWEEN 1 AND 80),
      kind text NOT NULL CHECK (char_length(kind) BETWEEN 1 AND 60),
      unit text NOT NULL,
      range_low numeric NOT NULL,
      range_high numeric NOT NULL,
      calibrated_on date NOT NULL,
      calibration_due_on date NOT NULL,
      retired_at timestamptz,
      CHECK (range_low < range_high),
      CHECK (calibration_due_on > calibrated_on),
      UNIQUE (organisation_id, id),
      UNIQUE (organisation_id, label)
    );

    CREATE TABLE licences (
      id uuid PRIMARY KEY DEFAULT uuid_v7(),
      person_id uuid NOT NULL REFERENCES people ON DELETE RESTRICT,
      kind text NOT NULL CHECK (char_length(kind) BETWEEN 1 AND 80),
      number text NOT NULL CHECK (char_length(number) BETWEEN 1 AND 80),
      valid_from date NOT NULL,
      valid_until date NOT NULL,
      CHECK (valid_until >= valid_from)
    );
    CREATE INDEX licences_person_idx ON licences (person_id);
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw(
    `DROP TABLE licences, instruments, job_cards, vehicles, cohort_members, cohorts, training_agreements`,
  );
}
