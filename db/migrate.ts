import { connect } from "@/db/client";
import { applyGrants } from "@/db/grants";
import { MIGRATIONS } from "@/db/migrations/all";
import { createQueues } from "@/db/queues";

/** The migrations as the migrator wants them: our own list instead of a folder, so that every runner loads them alike. */
const migrationSource = {
  getMigrations: async () => Object.keys(MIGRATIONS),
  getMigrationName: (name: string) => name,
  getMigration: async (name: string) => {
    const migration = MIGRATIONS[name];
    if (!migration) throw new Error(`No migration is named ${name}.`);
    return migration;
  },
};

/**
 * Brings the database to today's shape as its owner: tables, what the application's role may do, and the queue's own tables.
 * @param ownerUrl  connection of the role that owns the database.
 * @param appRole   name of the application's role, which must exist.
 * @returns         names of the migrations that ran; empty when there was nothing to do.
 */
export async function migrate(ownerUrl: string, appRole: string): Promise<string[]> {
  const db = connect(ownerUrl, 2);
  try {
    const [, ran] = (await db.migrate.latest({ migrationSource })) as [number, string[]];
    await applyGrants(db, appRole);
    await createQueues(ownerUrl);
    await db.raw(`GRANT USAGE ON SCHEMA pgboss TO ??`, [appRole]);
    await db.raw(`GRANT SELECT, INSERT, UPDATE, DELETE ON ALL TABLES IN SCHEMA pgboss TO ??`, [appRole]);
    await db.raw(`GRANT EXECUTE ON ALL FUNCTIONS IN SCHEMA pgboss TO ??`, [appRole]);
    return ran;
  } finally {
    await db.destroy();
  }
}
