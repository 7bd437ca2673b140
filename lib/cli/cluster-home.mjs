import { createHash } from "node:crypto";
import { resolve } from "node:path";
import { findProgram, run } from "./programs.mjs";
import { Told } from "./told.mjs";

/**
 * The folder of a data folder's cluster. PostgreSQL refuses root, and a clone under root's home can't be entered by anybody else: as
 * root the cluster lies outside the clone, under a name that follows from the data folder's.
 * @param {string} dataFolder
 */
export function clusterFolder(dataFolder, isRoot = process.getuid?.() === 0) {
  if (!isRoot) return resolve(dataFolder, "postgres");
  return `/var/lib/witnessline/${createHash("sha256").update(resolve(dataFolder)).digest("hex").slice(0, 12)}`;
}

/**
 * Who runs the server: ourselves, or as root the account `postgres`.
 * @typedef {{ uid?: number, gid?: number, command: (program: string, args: string[]) => [string, string[]] }} ServerAccount
 * @returns {Promise<ServerAccount>}
 */
export async function findServerAccount() {
  if (process.getuid?.() !== 0) return { command: (program, args) => [program, args] };
  const { code, output } = await run("getent", ["passwd", "postgres"]);
  const [, , uid, gid] = output.split(":").map(Number);
  if (code !== 0 || !uid || !gid) {
    throw new Told("PostgreSQL refuses to run as root, and this machine has no account `postgres`. Start as another person, or install Debian's package postgresql.");
  }
  if (findProgram("runuser")) return { uid, gid, command: (program, args) => ["runuser", ["-u", "postgres", "--", program, ...args]] };
  if (findProgram("setpriv")) {
    return { uid, gid, command: (program, args) => ["setpriv", ["--reuid=postgres", "--regid=postgres", "--init-groups", program, ...args]] };
  }
  throw new Told("PostgreSQL refuses to run as root, and neither runuser nor setpriv is here to change the account. Start as another person.");
}
