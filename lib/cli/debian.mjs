import { closeSync, mkdirSync, openSync, readdirSync } from "node:fs";
import { join } from "node:path";
import { lastLines } from "./children.mjs";
import { findPostgres, findProgram, run } from "./programs.mjs";
import { Told } from "./told.mjs";

/** Debian's package for each thing we need, and how to see that it is there; the same programs from elsewhere are as welcome. */
const NEEDS = {
  postgresql: () => Boolean(findPostgres()),
  ffmpeg: () => Boolean(findProgram("ffmpeg") && findProgram("ffprobe")),
  chromium: () => Boolean(findProgram("chromium")),
};

/** @typedef {keyof typeof NEEDS} DebianPackage */

/**
 * Installs what is missing with apt where this account may, and otherwise says the one line to run.
 * @param {DebianPackage[]} names
 * @param {string} logFolder
 * @returns {Promise<string>} what came of it.
 */
export async function installDebianPackages(names, logFolder) {
  const missing = names.filter((name) => !NEEDS[name]());
  if (missing.length === 0) return "in place";
  const how = howToInstall(missing, { hasApt: Boolean(findProgram("apt-get")), isRoot: process.getuid?.() === 0, maySudo: await maySudo() });
  if (how.ask) throw new Told(how.ask);

  mkdirSync(logFolder, { recursive: true });
  const log = join(logFolder, "apt.log");
  const file = openSync(log, "w");
  const apt = (...args) => {
    const [program, ...rest] = [...how.prefix, "env", "DEBIAN_FRONTEND=noninteractive", "apt-get", ...args];
    return run(program, rest, { log: file });
  };
  const install = () => apt("install", "-y", "--no-install-recommends", ...missing);
  let { code } = hasPackageLists() ? await install() : { code: 1 };
  if (code !== 0) {
    await apt("update");
    ({ code } = await install());
  }
  closeSync(file);
  const still = missing.filter((name) => !NEEDS[name]());
  if (code !== 0 || still.length > 0) {
    throw new Told(`apt could not install ${(still.length > 0 ? still : missing).join(", ")}. The last lines of ${log}:\n${lastLines(log)}`);
  }
  return `installed ${missing.join(", ")}`;
}

/**
 * Decides how missing packages can come onto this machine.
 * @param {string[]} missing
 * @param {{ hasApt: boolean, isRoot: boolean, maySudo: boolean }} machine
 * @returns {{ ask: string, prefix?: never } | { ask?: never, prefix: string[] }}
 *   `ask`: a sentence for the person; `prefix`: what goes before apt-get.
 */
export function howToInstall(missing, { hasApt, isRoot, maySudo }) {
  const names = missing.join(" ");
  if (!hasApt) return { ask: `Missing on this machine: ${missing.join(", ")}. There is no apt-get here; install them in this system's own way and start again.` };
  if (isRoot) return { prefix: [] };
  if (maySudo) return { prefix: ["sudo", "-n"] };
  return { ask: `Missing on this machine: ${missing.join(", ")}. Run this once, then start again:\n\n  sudo apt-get update && sudo apt-get install -y --no-install-recommends ${names}\n` };
}

const maySudo = async () => Boolean(findProgram("sudo")) && (await run("sudo", ["-n", "true"])).code === 0;

/** A fresh machine or container has no lists yet, and then nothing is found by name. */
function hasPackageLists() {
  try {
    return readdirSync("/var/lib/apt/lists").some((name) => name.includes("_Packages"));
  } catch {
    return false;
  }
}
