import { orgId } from "@/db/seeds/demo/ids";
import type { Knex } from "knex";
import { LedgerWriter } from "@/db/seeds/demo/ledger-writer";
import { seedCast } from "@/db/seeds/demo/seed-cast";
import { seedStandings } from "@/db/seeds/demo/seed-standings";
import { seedRecordings, seedTasks, type PutFile } from "@/db/seeds/demo/seed-work";

export type DemoOptions = {
  /** The day on which everything is current, yyyy-mm-dd; the same day always gives the same demo. */
  day: string;
  passwordHash: string;
  putFile: PutFile;
};

/** Loads the demo, whole or not at all. Returns false where it is loaded already. */
export async function loadDemo(db: Knex, { day, passwordHash, putFile }: DemoOptions): Promise<boolean> {
  if (await db("organisations").select("id").where({ id: orgId("merrowdale") }).first()) return false;
  await db.transaction(async (trx) => {
    const ledger = new LedgerWriter(trx);
    await seedCast(trx, day, passwordHash);
    await seedTasks(trx, day, ledger);
    await seedRecordings(trx, day, ledger, putFile);
    await seedStandings(trx, day, ledger, putFile);
  });
  return true;
}
