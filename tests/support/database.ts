import { randomUUID } from "node:crypto";
import { afterAll, beforeAll } from "vitest";
import { connect, getDb } from "@/db/client";
import { migrate } from "@/db/migrate";
import type { Knex } from "knex";

const TEMPLATE = "witnessline_test_template";
/** Any number that only our own template's making uses. */
const TEMPLATE_LOCK = 7_260_001;

const adminUrl = (): string => {
  const url = process.env.TEST_DATABASE_ADMIN_URL;
  if (!url) throw new Error('Set TEST_DATABASE_ADMIN_URL, for example by: eval "$(node lib/cli/dev-cluster.mjs)"');
  return url;
};
const onDatabase = (url: string, database: string): string => {
  const changed = new URL(url);
  changed.pathname = `/${database}`;
  return changed.href;
};
const urlOf = (variable: "TEST_OWNER_URL" | "TEST_APP_URL", database: string): string => {
  const url = process.env[variable];
  if (!url) throw new Error(`Set ${variable}, see lib/cli/dev-cluster.mjs`);
  return onDatabase(url, database);
};

/** Brings the template up to date, one test file at a time; the others wait for the lock and then find nothing to do. */
async function prepareTemplate(admin: Knex): Promise<void> {
  const { rows } = await admin.raw(`SELECT 1 FROM pg_database WHERE datname = ?`, [TEMPLATE]);
  const owner = new URL(urlOf("TEST_OWNER_URL", TEMPLATE)).username;
  if (rows.length === 0) await admin.raw(`CREATE DATABASE ?? OWNER ??`, [TEMPLATE, owner]);
  await migrate(urlOf("TEST_OWNER_URL", TEMPLATE), new URL(urlOf("TEST_APP_URL", TEMPLATE)).username);
}

export type TestDatabase = {
  /** The application's own pool, as the application's role. */
  db: () => Knex;
  /** As the owner, for arranging what the application's role may not. */
  owner: () => Knex;
  /** The application role's address, for processes of their own. */
  url: () => string;
};

/** Gives the calling test file a database of its own, copied from the migrated template and dropped afterwards. */
export function testDatabase(): TestDatabase {
  const name = `witnessline_test_${randomUUID().replaceAll("-", "")}`;
  let owner: Knex | undefined;

  beforeAll(async () => {
    const admin = connect(adminUrl(), 1);
    try {
      await admin.raw(`SELECT pg_advisory_lock(?)`, [TEMPLATE_LOCK]);
      await prepareTemplate(admin);
      await admin.raw(`CREATE DATABASE ?? TEMPLATE ??`, [name, TEMPLATE]);
      await admin.raw(`SELECT pg_advisory_unlock(?)`, [TEMPLATE_LOCK]);
    } finally {
      await admin.destroy();
    }
    process.env.DATABASE_URL = urlOf("TEST_APP_URL", name);
    owner = connect(urlOf("TEST_OWNER_URL", name), 2);
  });

  afterAll(async () => {
    await getDb().destroy();
    await owner?.destroy();
    const admin = connect(adminUrl(), 1);
    await admin.raw(`DROP DATABASE IF EXISTS ?? WITH (FORCE)`, [name]);
    await admin.destroy();
  });

  return {
    db: getDb,
    owner: () => {
      if (!owner) throw new Error("The database is made in beforeAll.");
      return owner;
    },
    url: () => urlOf("TEST_APP_URL", name),
  };
}
