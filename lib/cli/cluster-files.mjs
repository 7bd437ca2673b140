import { chmodSync, chownSync, existsSync, mkdirSync, readFileSync, renameSync, rmSync, writeFileSync } from "node:fs";
import { dirname, join } from "node:path";
import { Told } from "./told.mjs";

/**
 * Makes the cluster's files: a superuser with a password, SCRAM for everybody.
 * @param {{ folder: string, account: import("./cluster-home.mjs").ServerAccount, server: Function, secrets: import("./secrets.mjs").Secrets }} parts
 */
export async function initialiseCluster({ folder, account, server, secrets }) {
  mkdirSync(folder, { recursive: true });
  chmodSync(folder, 0o700);
  writeFileSync(join(folder, "instance"), secrets.instance);
  const whole = join(folder, "data");
  const fresh = join(folder, "data.new"); // renamed when whole, so that a start that was cut off leaves nothing that looks finished
  rmSync(fresh, { recursive: true, force: true });
  const passwordFile = join(folder, "password");
  writeFileSync(passwordFile, `${secrets.superuserPassword}\n`, { mode: 0o600 });
  if (account.uid) {
    chmodSync(dirname(folder), 0o755); // the server's account must be able to walk through it
    for (const path of [folder, passwordFile]) chownSync(path, account.uid, account.gid);
  }
  const made = await server("initdb", [
    "-D", fresh, "-U", "postgres", `--pwfile=${passwordFile}`, "--auth=scram-sha-256", "--encoding=UTF8", "--locale=C.UTF-8", "--no-instructions",
  ]);
  rmSync(passwordFile, { force: true });
  if (made.code !== 0) throw new Told(`PostgreSQL's files could not be made in ${folder}:\n${made.output.trim().split("\n").slice(-4).join("\n")}`);
  renameSync(fresh, whole);
}

/**
 * Whether the cluster belongs to another data folder than this: one that was deleted, with the passwords and the files that belong to
 * the cluster's rows. Nothing can use it any more.
 * @param {string} folder
 * @param {string} instance
 */
export function isForeignCluster(folder, instance) {
  if (!existsSync(folder)) return false;
  const mark = join(folder, "instance");
  return !existsSync(mark) || readFileSync(mark, "utf8") !== instance;
}

/**
 * The server that runs on these files, by its pid file; undefined when there is none, or when the file is what a crash left and its
 * number belongs to another program by now.
 * @param {string} folder
 * @returns {{ pid: number, port: number } | undefined}
 */
export function findServer(folder) {
  const data = join(folder, "data");
  try {
    const [pid, , , port] = readFileSync(join(data, "postmaster.pid"), "utf8").split("\n"); // process, data folder, start, port
    const isOurs = readFileSync(`/proc/${Number(pid)}/cmdline`, "utf8").split("\0").includes(data);
    return isOurs ? { pid: Number(pid), port: Number(port) } : undefined;
  } catch {
    return undefined;
  }
}
