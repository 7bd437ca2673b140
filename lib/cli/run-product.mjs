import { readdirSync, rmSync } from "node:fs";
import { dirname, join, resolve } from "node:path";
import { fileURLToPath } from "node:url";
import { buildApplication } from "./build.mjs";
import { removeCluster, startCluster } from "./cluster.mjs";
import { installDebianPackages } from "./debian.mjs";
import { checkDisk } from "./disk.mjs";
import { launchApplication, launchStoreAndMail, loadDemo, migrateDatabase } from "./launch.mjs";
import { readWishedPort, readWords } from "./options.mjs";
import { installPackages } from "./packages.mjs";
import { choosePorts, isPortFree, keepPorts, readPorts } from "./ports.mjs";
import { readSecrets } from "./secrets.mjs";
import { settingsFor } from "./settings.mjs";
import { describeSignIns, readSignIns } from "./sign-ins.mjs";
import { secondsSince, stage } from "./stages.mjs";
import { supervise } from "./supervise.mjs";
import { runCommand, Told } from "./told.mjs";

// `npm start`: everything from a fresh clone to a running product. `--dev` with hot reload, `--fresh` from nothing.
const root = resolve(dirname(fileURLToPath(import.meta.url)), "../..");
const dataFolder = join(root, ".data");
const USUAL_PORTS = { app: 4200, store: 4201, mail: 4202, mailPage: 4203 };
const USUAL_DATABASE_PORT = 4204;
/** What `--fresh` leaves: the claims of running copies, the tests' own ground, and the build, which holds no data. */
const KEPT = new Set(["running", "logs", "test", "dev-cluster", "build.json"]);

await runCommand(() => {
  const words = readWords(process.argv.slice(2), ["--dev", "--fresh"]);
  const wishedPort = readWishedPort(process.env.PORT);
  return supervise(dataFolder, (children) => startProduct(children, { isDev: words.has("--dev"), isFresh: words.has("--fresh"), wishedPort }), { askedCode: 0 });
});

async function startProduct(children, { isDev, isFresh, wishedPort }) {
  const began = performance.now();
  const logFolder = children.logFolder;
  console.log("Witnessline");
  await stage("Room on the disk", () => checkDisk(process.getuid?.() === 0 ? [root, "/var/lib"] : [root]));
  if (isFresh) await stage("Begin again", beginAgain);
  await stage("npm packages", () => installPackages(root, logFolder));
  await stage("Debian packages", () => installDebianPackages(["postgresql", "ffmpeg"], logFolder));

  let cluster;
  await stage("PostgreSQL", async () => (cluster = await startCluster({ dataFolder, usualPort: USUAL_DATABASE_PORT })).outcome);
  const ports = await findPorts(wishedPort);
  const database = "witnessline";
  const env = settingsFor({ ports, secrets: readSecrets(dataFolder), cluster, database });
  const ground = { root, dataFolder, ports, env, children, cluster, database, isDev };
  await stage("Store and mail", () => launchStoreAndMail(ground));
  await stage("Migrations", () => migrateDatabase(ground));
  await stage("Demo", () => loadDemo(ground));
  if (!isDev) await stage("Build", () => buildApplication({ root, dataFolder, logFolder, distDir: ".next", env }));
  await stage("Application, worker", () => launchApplication(ground));

  console.log(`\n  Ready after ${secondsSince(began)}. Open ${env.APP_URL} and sign in as one of:\n${describeSignIns(readSignIns(root))}`);
  console.log(`\n  Mail that the product sends: ${env.MAIL_SINK_URL}\n  Logs: ${logFolder}\n  Ctrl-C stops everything.\n`);
  throw new Told(await children.unexpectedEnd);
}

async function beginAgain() {
  await removeCluster(dataFolder);
  for (const name of readdirSync(dataFolder)) if (!KEPT.has(name)) rmSync(join(dataFolder, name), { recursive: true, force: true });
  return "data and cluster removed";
}

/** The ports of last time where they are free; says so when the address changes. */
async function findPorts(wishedPort) {
  if (wishedPort && !(await isPortFree(wishedPort))) throw new Told(`Port ${wishedPort} is taken by another program. Give another PORT, or none.`);
  const remembered = readPorts(dataFolder);
  const ports = await choosePorts(wishedPort ? { ...USUAL_PORTS, app: wishedPort } : USUAL_PORTS, wishedPort ? { ...remembered, app: wishedPort } : remembered);
  const expected = wishedPort ?? remembered.app ?? USUAL_PORTS.app;
  if (ports.app !== expected) console.log(`  Port ${expected} is taken by another program; the address is at ${ports.app} this time and from now on.`);
  keepPorts(dataFolder, ports);
  return ports;
}
