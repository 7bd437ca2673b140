import { createHash } from "node:crypto";
import { resolve } from "node:path";
import { findProgram, run } from "./programs.mjs";
import { Told } from "./told.mjs";

/**
 * Where a cluster lives and who runs it. PostgreSQL refuses root, and a clone under root's home can't be entered by anybody else: as
 * root the server runs as `postgres`, in a folder that this account can reach, named after the data folder it belongs to.
 * @typedef {{ folder: string, asServer: (program: string, args: string[]) => [string, string[]], account?: { uid: number, gid: number } }} ClusterHome
 */

/**
 * @param {string} dataFolder
 * @returns {Promise<ClusterHome>}
 */
export async function findClusterHome(dataFolder) {
  if (process.getuid?.() !== 0) {
    return { folder: resolve(dataFolder, "postgres"), asServer: (program, args) => [program, args] };
  }
  const account = await findAccount("postgres");
  if (!account) throw new Told("PostgreSQL refuses to run as root, and this machine has no account `postgres`. Start as another person, or install the Debian package postgresql.");
  const name = createHash("sha256").update(resolve(dataFolder)).digest("hex").slice(0, 12);
  return { folder: `/var/lib/witnessline/${name}`, asServer: asPostgres(), account };
}

function asPostgres() {
  if (findProgram("runuser")) return (program, args) => ["runuser", ["-u", "postgres", "--", program, ...args]];
  if (findProgram("setpriv")) {
    return (program, args) => ["setpriv", ["--reuid=postgres", "--regid=postgres", "--init-groups", program, ...args]];
  }
  throw new Told("PostgreSQL refuses to run as root, and neither runuser nor setpriv is here to change the account. Start as another person.");
}

async function findAccount(name) {
  const { code, output } = await run("getent", ["passwd", name]);
  const [, , uid, gid] = output.split(":");
  return code === 0 && uid && gid ? { uid: Number(uid), gid: Number(gid) } : undefined;
}
