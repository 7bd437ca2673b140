import type { Knex } from "knex";

/** Letters leave in the transaction that causes them; a worker hands them to SMTP afterwards. */
export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    CREATE TABLE mail_outbox (
      id uuid PRIMARY KEY DEFAULT uuid_v7(),
      to_address text NOT NULL CHECK (to_address LIKE '%_@_%'),
      subject text NOT NULL CHECK (char_length(subject) BETWEEN 1 AND 200 AND subject !~ '[\\r\\n]'),
      body text NOT NULL,
      -- Two causes with the same key are one letter.
      dedupe_key text UNIQUE,
      created_at timestamptz NOT NULL DEFAULT now(),
      next_attempt_at timestamptz NOT NULL DEFAULT now(),
      attempts integer NOT NULL DEFAULT 0 CHECK (attempts >= 0),
      last_failure text,
      sent_at timestamptz
    );
    CREATE INDEX mail_outbox_waiting_idx ON mail_outbox (next_attempt_at) WHERE sent_at IS NULL;
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw(`DROP TABLE mail_outbox`);
}
