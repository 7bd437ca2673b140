import type { Knex } from "knex";
import { addLetter } from "@/db/queries/mail-outbox";
import type { Letter } from "@/lib/core/letters/letter";
import { enqueue } from "@/lib/jobs/enqueue";

/** Writes a letter and asks the worker to send it, both or neither, with whatever caused it. */
export async function postLetter(trx: Knex.Transaction, letter: Letter): Promise<void> {
  const letterId = await addLetter(trx, letter);
  if (letterId) await enqueue(trx, "send-mail", { letterId });
}
