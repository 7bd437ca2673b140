import type { Knex } from "knex";

/** What every later migration leans on: exclusion constraints over ids, keys that sort by time, and a trigger that refuses change. */
export async function up(knex: Knex): Promise<void> {
  await knex.raw(`CREATE EXTENSION IF NOT EXISTS btree_gist`);
  // RFC 9562 UUIDv7: 48 bits of Unix milliseconds, then version 7 and random bits. PostgreSQL 15 has no function of its own for it.
  await knex.raw(`
    CREATE FUNCTION uuid_v7() RETURNS uuid LANGUAGE sql VOLATILE AS $$
      SELECT encode(
        set_bit(set_bit(
          overlay(uuid_send(gen_random_uuid())
            PLACING substring(int8send(floor(extract(epoch FROM clock_timestamp()) * 1000)::bigint) FROM 3)
            FROM 1 FOR 6),
          52, 1), 53, 1), 'hex')::uuid
    $$`);
  // For rows that must stand as they were written, whoever asks, the owner of the database included.
  await knex.raw(`
    CREATE FUNCTION refuse_change() RETURNS trigger LANGUAGE plpgsql AS $$
    BEGIN
      RAISE EXCEPTION '% is written once and never changed', TG_TABLE_NAME USING ERRCODE = 'restrict_violation';
    END $$`);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw(`DROP FUNCTION refuse_change()`);
  await knex.raw(`DROP FUNCTION uuid_v7()`);
}
