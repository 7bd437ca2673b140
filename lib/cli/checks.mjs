import { closeSync, mkdirSync, openSync } from "node:fs";
import { join } from "node:path";
import { buildApplication } from "./build.mjs";
import { lastLines } from "./children.mjs";
import { launchApplication, launchStoreAndMail, loadDemo, migrateDatabase } from "./launch.mjs";
import { run } from "./programs.mjs";
import { countPlaywright, countVitest, readReport, settleCounts } from "./reports.mjs";
import { settingsFor } from "./settings.mjs";

/**
 * The stages of `npm test`. Each gives its counts; servers are those of the ground it is given.
 * @typedef {{ root: string, dataFolder: string, logFolder: string, cluster?: import("./cluster.mjs").Cluster, ports: Record<string, number>,
 *   secrets: import("./secrets.mjs").Secrets, children: import("./children.mjs").Children }} TestGround
 */

/** The build of the tests, apart from the product's. */
const DIST_DIR = ".data/test/next";

const tool = (path) => join("node_modules", path);
const TYPEGEN = [tool("next/dist/bin/next"), "typegen"];

export const CHECKS = {
  types: { title: "Types", work: checkTypes },
  lint: { title: "Lint", work: (ground) => checkByExitCode(ground, "lint", [[tool("eslint/bin/eslint.js"), "."]]) },
  imports: { title: "Import directions", work: checkImports },
  unit: { title: "Unit and database", work: checkUnits, needsDatabase: true },
  browser: { title: "Browser", work: checkInBrowser, needsDatabase: true, needsBrowser: true },
};

/** The framework writes the types of the addresses first; our own types lean on them. */
function checkTypes(ground) {
  return checkByExitCode(ground, "types", [TYPEGEN, [tool("typescript/bin/tsc"), "--noEmit", "-p", "."]]);
}

function checkImports(ground) {
  const rooms = ["app", "components", "lib", "db", "storage", "tests"];
  return checkByExitCode(ground, "imports", [[tool("dependency-cruiser/bin/dependency-cruise.mjs"), ...rooms, "--config", ".dependency-cruiser.cjs"]]);
}

/** A tool without a report of its own counts as one check: its exit code. */
async function checkByExitCode(ground, name, commands) {
  for (const command of commands) {
    const { code, log } = await runLogged(ground, name, command, process.env);
    if (code !== 0) return { passed: 0, failed: 1, skipped: 0, problems: [lastLines(log, 60)] };
  }
  return { passed: 1, failed: 0, skipped: 0, problems: [] };
}

async function checkUnits(ground) {
  const path = join(ground.dataFolder, "unit.json");
  const { code, log } = await runLogged(ground, "unit",
    [tool("vitest/vitest.mjs"), "run", "--reporter=default", "--reporter=json", `--outputFile.json=${path}`],
    { ...process.env, ...databaseUrls(ground) });
  const report = readReport(path);
  return settleCounts(report && countVitest(report), code, lastLines(log));
}

async function checkInBrowser(ground) {
  const { root, dataFolder, logFolder, secrets, cluster, ports } = ground;
  const database = "witnessline_browser";
  const env = { ...settingsFor({ ports, secrets, cluster, database }), ...databaseUrls(ground), NEXT_DIST_DIR: DIST_DIR };
  const installation = { ...ground, env, database };
  await launchStoreAndMail(installation);
  await migrateDatabase(installation);
  await loadDemo(installation);
  await buildApplication({ root, dataFolder, logFolder, distDir: DIST_DIR, env });
  await runLogged(ground, "typegen", TYPEGEN, process.env); // the build made next-env.d.ts point at its own folder
  await launchApplication(installation);

  const path = join(dataFolder, "browser.json");
  const { code, log } = await runLogged(ground, "browser", [tool("@playwright/test/cli.js"), "test", "--reporter=line,json"],
    { ...env, E2E_BASE_URL: env.APP_URL, PLAYWRIGHT_JSON_OUTPUT_FILE: path });
  const report = readReport(path);
  return settleCounts(report && countPlaywright(report), code, lastLines(log));
}

const databaseUrls = ({ cluster }) => ({
  TEST_DATABASE_ADMIN_URL: cluster.adminUrl,
  TEST_OWNER_URL: cluster.ownerUrl("postgres"),
  TEST_APP_URL: cluster.appUrl("postgres"),
});

async function runLogged({ root, logFolder }, name, args, env) {
  mkdirSync(logFolder, { recursive: true });
  const log = join(logFolder, `${name}.log`);
  const file = openSync(log, "w");
  const { code } = await run(process.execPath, args, { cwd: root, env, log: file });
  closeSync(file);
  return { code, log };
}
