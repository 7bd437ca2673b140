import { readdirSync, rmSync } from "node:fs";
import { dirname, join, resolve } from "node:path";
import { fileURLToPath } from "node:url";
import { CHECKS } from "./checks.mjs";
import { removeCluster, startCluster } from "./cluster.mjs";
import { installDebianPackages } from "./debian.mjs";
import { checkDisk } from "./disk.mjs";
import { readWords } from "./options.mjs";
import { installPackages } from "./packages.mjs";
import { choosePorts } from "./ports.mjs";
import { readSecrets } from "./secrets.mjs";
import { secondsSince, stage } from "./stages.mjs";
import { supervise } from "./supervise.mjs";
import { describeFailure, runCommand, Told } from "./told.mjs";

// `npm test`: every check on servers of its own. `npm test -- types lint` runs some of them only.
const root = resolve(dirname(fileURLToPath(import.meta.url)), "../..");
const dataFolder = join(root, ".data/test");
const USUAL_PORTS = { app: 4300, store: 4301, mail: 4302, mailPage: 4303 };
const USUAL_DATABASE_PORT = 4304;
/** What one run leaves to the next: logs to read, and the build where the sources are the same. */
const KEPT = new Set(["running", "logs", "next", "build.json"]);
const total = { passed: 0, failed: 0, skipped: 0 };

await runCommand(async () => {
  const began = performance.now();
  const code = await supervise(dataFolder, testAll).catch((error) => {
    console.error(describeFailure(error));
    total.failed += 1;
    return 1;
  });
  if (code === 130) total.failed += 1; // the check that was cut off
  console.log(`\n  ${secondsSince(began)} in all${total.skipped > 0 ? `; ${total.skipped} skipped, which count as neither` : ""}`);
  console.log(`${total.passed} passed, ${total.failed} failed`);
  return code;
});

async function testAll(children) {
  const words = readWords(process.argv.slice(2), /** @type {(keyof typeof CHECKS)[]} */ (Object.keys(CHECKS)));
  const checks = Object.entries(CHECKS).filter(([name]) => words.size === 0 || words.has(name)).map(([, check]) => check);
  const ground = await prepare(children, checks);
  for (const { title, work } of checks) await runCheck(title, () => work(ground));
  if (ground.cluster) await removeCluster(dataFolder);
  return total.failed === 0 ? 0 : 1;
}

async function prepare(children, checks) {
  const { logFolder } = children;
  const needsDatabase = checks.some((check) => check.needsDatabase);
  const debian = [...(needsDatabase ? ["postgresql", "ffmpeg"] : []), ...(checks.some((check) => check.needsBrowser) ? ["chromium"] : [])];
  await stage("Room on the disk", () => checkDisk(process.getuid?.() === 0 ? [root, "/var/lib"] : [root]));
  await removeCluster(dataFolder);
  for (const name of readdirSync(dataFolder)) if (!KEPT.has(name)) rmSync(join(dataFolder, name), { recursive: true, force: true });
  await stage("npm packages", () => installPackages(root, logFolder));
  await stage("Debian packages", () => installDebianPackages(debian, logFolder));
  const ground = { root, dataFolder, logFolder, children, secrets: readSecrets(dataFolder), ports: await choosePorts(USUAL_PORTS, {}) };
  if (needsDatabase) {
    await stage("PostgreSQL", async () => (ground.cluster = await startCluster({ dataFolder, usualPort: USUAL_DATABASE_PORT, forTests: true })).outcome);
  }
  return ground;
}

/** Runs one check and adds to the total; a check that can't be carried out has failed, and the others still run. */
async function runCheck(title, work) {
  let counts;
  await stage(title, async () => {
    counts = await work().catch((error) => ({ passed: 0, failed: 1, skipped: 0, problems: [error instanceof Told ? error.message : String(error.stack)] }));
    return `${counts.passed} passed, ${counts.failed} failed`;
  });
  for (const key of Object.keys(total)) total[key] += counts[key];
  for (const problem of counts.problems) console.log(`\n${problem.replace(/^/gm, "    ")}\n`);
}
