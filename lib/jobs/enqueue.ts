import type { Knex } from "knex";
import PgBoss from "pg-boss";
import type { QueueName } from "@/db/queues";

/** Runs the queue's SQL inside the caller's transaction, so that a job exists exactly when what caused it does. */
const inTransaction = (trx: Knex.Transaction): PgBoss.ConnectionOptions => ({
  db: {
    async executeSql(text, values) {
      // The queue numbers its placeholders and may use one twice; knex.raw takes one "?" for each use.
      const bindings: unknown[] = [];
      const sql = text.replaceAll("?", "\\?").replace(/\$(\d+)/g, (_, position: string) => {
        bindings.push(values[Number(position) - 1] ?? null);
        return "?";
      });
      return trx.raw(sql, bindings as Knex.RawBinding[]);
    },
  },
});

// Only ever used to send, with a transaction of the caller's: it opens no connection of its own.
let sender: PgBoss | undefined;

/** Puts a job in a queue as part of `trx`. `data` is checked again by the job that reads it. */
export async function enqueue(trx: Knex.Transaction, queue: QueueName, data: object): Promise<void> {
  sender ??= new PgBoss({ db: { executeSql: () => Promise.reject(new Error("enqueue needs a transaction")) } });
  await sender.send(queue, data, inTransaction(trx));
}
