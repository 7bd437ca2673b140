import type { Knex } from "knex";
import type { Db } from "@/db/client";
import { letterBody, type Letter } from "@/lib/core/letters/letter";

/** Writes a letter to the outbox; undefined where one with the same key is there already. */
export async function addLetter(trx: Knex.Transaction, letter: Letter): Promise<string | undefined> {
  const [row] = await trx("mail_outbox")
    .insert({ to_address: letter.to, subject: letter.subject, body: letterBody(letter), dedupe_key: letter.dedupeKey ?? null })
    .onConflict("dedupe_key")
    .ignore()
    .returning<{ id: string }[]>("id");
  return row?.id;
}

export type OutgoingLetter = { id: string; to: string; subject: string; body: string };

/** Locks one letter that waits to be sent; undefined where it was sent or another worker holds it. */
export async function lockUnsentLetter(trx: Knex.Transaction, id: string): Promise<OutgoingLetter | undefined> {
  const row = await trx("mail_outbox")
    .select("id", "to_address", "subject", "body")
    .where({ id })
    .whereNull("sent_at")
    .forUpdate()
    .skipLocked()
    .first();
  return row && { id: row.id, to: row.to_address, subject: row.subject, body: row.body };
}

/** Notes that it left, and forgets the token of a single-use link: from then on only its hash is kept anywhere. */
export async function markLetterSent(trx: Knex.Transaction, id: string): Promise<void> {
  await trx("mail_outbox")
    .where({ id })
    .update({
      sent_at: trx.fn.now(),
      attempts: trx.raw("attempts + 1"),
      last_failure: null,
      body: trx.raw(`regexp_replace(body, ?, '#…', 'g')`, ["#[A-Za-z0-9_-]{43}(?![A-Za-z0-9_-])"]),
    });
}

/** Notes why it did not leave; the queue tries again later. */
export async function noteLetterFailure(db: Db, id: string, failure: string): Promise<void> {
  await db("mail_outbox").where({ id }).update({ attempts: db.raw("attempts + 1"), last_failure: failure.slice(0, 500) });
}
