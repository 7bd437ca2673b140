import { spawn } from "node:child_process";
import { accessSync, constants, readdirSync } from "node:fs";
import { delimiter, join } from "node:path";

/**
 * Where a program is, or undefined.
 * @param {string} name
 * @param {string[]} [folders]  where to look; PATH and the folders of the system's keeper when left out.
 * @returns {string | undefined}
 */
export function findProgram(name, folders = [...(process.env.PATH ?? "").split(delimiter), "/usr/sbin", "/sbin"]) {
  for (const folder of folders.filter(Boolean)) {
    const path = join(folder, name);
    try {
      accessSync(path, constants.X_OK);
      return path;
    } catch {
      // Not here; look on.
    }
  }
  return undefined;
}

/**
 * The folder with the server programs of the newest PostgreSQL on this machine. Debian keeps them off PATH.
 * @returns {string | undefined}
 */
export function findPostgres(base = "/usr/lib/postgresql") {
  let versions = [];
  try {
    versions = readdirSync(base).filter((name) => /^\d+$/.test(name)).map(Number).filter((version) => version >= 15);
  } catch {
    // Not a Debian machine, or no PostgreSQL yet.
  }
  const debian = versions.sort((a, b) => b - a).map((version) => join(base, String(version), "bin"));
  const folders = [...debian, ...(process.env.PATH ?? "").split(delimiter)];
  return folders.find((folder) => ["initdb", "pg_ctl", "psql"].every((program) => findProgram(program, [folder])));
}

const running = new Set();

/** Ends every program that `run` still waits for. */
export async function stopPrograms() {
  const ends = [...running].map((child) => new Promise((resolve) => child.once("close", resolve)));
  for (const child of running) child.kill("SIGTERM");
  await Promise.race([Promise.all(ends), new Promise((resolve) => setTimeout(resolve, 5000).unref())]);
}

/**
 * Runs a program to its end.
 * @param {string} program
 * @param {string[]} args
 * @param {{ input?: string, env?: NodeJS.ProcessEnv, cwd?: string, log?: number, discard?: boolean }} [options]
 *   `log`: an open file that takes all output. `discard`: let nothing of the output be kept open, for a program that leaves a server behind.
 * @returns {Promise<{ code: number, output: string }>}  127 when the program could not be started.
 */
export function run(program, args, { input, env, cwd, log, discard } = {}) {
  return new Promise((resolve) => {
    const out = discard ? "ignore" : (log ?? "pipe");
    const child = spawn(program, args, { cwd, env: env ?? process.env, stdio: [input === undefined ? "ignore" : "pipe", out, out] });
    let output = "";
    child.stdout?.on("data", (chunk) => (output += chunk));
    child.stderr?.on("data", (chunk) => (output += chunk));
    running.add(child);
    const end = (result) => (running.delete(child), resolve(result));
    child.on("error", (error) => end({ code: 127, output: String(error) }));
    child.on("close", (code) => end({ code: code ?? 128, output }));
    child.stdin?.on("error", () => {}); // A program that ends early closes its input; its exit code says so.
    if (input !== undefined) child.stdin?.end(input);
  });
}
