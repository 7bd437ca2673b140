import { closeSync, mkdirSync, openSync, readFileSync } from "node:fs";
import { join } from "node:path";
import { lastLines } from "./children.mjs";
import { run } from "./programs.mjs";
import { Told } from "./told.mjs";

/**
 * Installs the npm packages of the lockfile unless they are all there. npm writes down what it installed only once it has finished, so
 * an installation that was cut off is seen as missing.
 * @param {string} root  the clone.
 * @param {string} logFolder
 * @returns {Promise<string>} what came of it.
 */
export async function installPackages(root, logFolder) {
  const wanted = readJson(join(root, "package-lock.json"));
  if (!wanted) throw new Told("package-lock.json is missing or broken. Take it from the repository again.");
  if (arePackagesInstalled(wanted, readJson(join(root, "node_modules/.package-lock.json")))) return "in place";
  mkdirSync(logFolder, { recursive: true });
  const log = join(logFolder, "npm.log");
  const file = openSync(log, "w");
  const { code } = await run("npm", ["ci", "--include=dev", "--no-audit", "--no-fund", "--no-update-notifier"], { cwd: root, log: file });
  closeSync(file);
  if (code !== 0) throw new Told(`npm could not install the packages; is the network there? The last lines of ${log}:\n${lastLines(log)}`);
  return "installed";
}

/**
 * @param {{ packages: Record<string, LockedPackage> }} wanted  the lockfile.
 * @param {{ packages: Record<string, LockedPackage> } | undefined} installed  npm's own note of what is in node_modules.
 * @typedef {{ version?: string, optional?: boolean, devOptional?: boolean, peer?: boolean }} LockedPackage
 */
export function arePackagesInstalled(wanted, installed) {
  return Boolean(installed) && Object.entries(wanted.packages).every(([path, { version, optional, devOptional }]) =>
    path === "" || optional || devOptional || installed.packages[path]?.version === version);
}

function readJson(path) {
  try {
    return JSON.parse(readFileSync(path, "utf8"));
  } catch {
    return undefined;
  }
}
