import { closeSync, mkdirSync, openSync } from "node:fs";
import { join } from "node:path";
import { lastLines } from "./children.mjs";
import { run } from "./programs.mjs";
import { waitForHttp, waitForTcp } from "./ready.mjs";
import { Told } from "./told.mjs";

/**
 * Everything that a running installation consists of, one function a stage. Both commands use them, on different ground.
 * @typedef {{ root: string, dataFolder: string, ports: Record<string, number>, env: Record<string, string>,
 *   children: import("./children.mjs").Children, cluster: import("./cluster.mjs").Cluster, database: string }} Ground
 */

const TYPESCRIPT = ["--import", "tsx"];
const NEXT = "node_modules/next/dist/bin/next";

/** Makes the application's database when it is missing. @param {Ground} ground */
export async function ensureDatabase({ cluster, database }) {
  await cluster.sql(`
    SELECT 'CREATE DATABASE ${database} OWNER witnessline_owner' WHERE NOT EXISTS (SELECT FROM pg_database WHERE datname = '${database}') \\gexec
    REVOKE ALL ON DATABASE ${database} FROM PUBLIC;
    GRANT CONNECT, TEMPORARY ON DATABASE ${database} TO witnessline_app;`);
  // A start that was killed while migrating leaves the migrations locked. Nobody else migrates here: the data folder is ours alone.
  await cluster.sql(`SELECT 'UPDATE knex_migrations_lock SET is_locked = 0' WHERE to_regclass('public.knex_migrations_lock') IS NOT NULL \\gexec`, database);
}

/** @param {Ground} ground */
export async function migrateDatabase(ground) {
  await ensureDatabase(ground);
  const output = await runScript(ground, "migrate", "lib/cli/migrate.ts");
  return output.split("\n").at(-1);
}

/** @param {Ground} ground */
export async function loadDemo(ground) {
  const output = await runScript(ground, "demo", "lib/cli/load-demo.ts");
  return output.split("\n").at(-1);
}

/** The object store and the mail sink. @param {Ground} ground */
export async function launchStoreAndMail({ root, dataFolder, ports, env, children }) {
  children.start("store", [...TYPESCRIPT, "storage/fake/main.ts"], {
    cwd: root,
    env: { ...env, FAKE_STORE_DIR: join(dataFolder, "store"), FAKE_STORE_PORT: String(ports.store), FAKE_STORE_ORIGINS: env.APP_URL },
  });
  children.start("mail", [...TYPESCRIPT, "lib/cli/mail-sink/main.ts"], {
    cwd: root,
    env: { ...env, MAIL_SINK_DIR: join(dataFolder, "mail"), MAIL_SINK_SMTP_PORT: String(ports.mail), MAIL_SINK_PORT: String(ports.mailPage) },
  });
  await children.orEnd(Promise.all([waitForTcp("store", ports.store), waitForHttp("mail page", env.MAIL_SINK_URL)]));
  return "started";
}

/** The job worker and the application, the latter with hot reload when `isDev`. @param {Ground & { isDev?: boolean }} ground */
export async function launchApplication({ root, ports, env, children, isDev = false }) {
  children.start("worker", [...TYPESCRIPT, ...(isDev ? ["--watch"] : []), "lib/jobs/worker.ts"], { cwd: root, env });
  children.start("app", [NEXT, isDev ? "dev" : "start", "-H", "127.0.0.1", "-p", String(ports.app)], { cwd: root, env, echo: isDev });
  await children.orEnd(waitForHttp("application", `${env.APP_URL}/`, isDev ? 180_000 : 60_000));
  return "answers";
}

/** Runs one of our own TypeScript commands to its end and gives what it printed. */
async function runScript({ root, env, children }, name, script) {
  mkdirSync(children.logFolder, { recursive: true });
  const log = join(children.logFolder, `${name}.log`);
  const file = openSync(log, "w");
  const { code } = await run(process.execPath, [...TYPESCRIPT, script], { cwd: root, env, log: file });
  closeSync(file);
  if (code !== 0) throw new Told(`${script} failed. The last lines of ${log}:\n${lastLines(log)}`);
  return lastLines(log);
}
