import { createHash } from "node:crypto";
import { closeSync, existsSync, mkdirSync, openSync, readdirSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { join } from "node:path";
import { lastLines } from "./children.mjs";
import { run } from "./programs.mjs";
import { Told } from "./told.mjs";

/** What goes into the built application. Commands, seeds and the store's fake don't. */
const ROOMS = ["app", "components", "lib", "db", "storage", "public"];
const NOT_BUILT = new Set(["lib/cli", "db/seeds", "storage/fake"]);

/**
 * A hash over every source of the build, names and contents.
 * @param {string} root
 */
export function hashSources(root) {
  const hash = createHash("sha256");
  const add = (path) => hash.update(`${path}\0`).update(readFileSync(join(root, path))).update("\0");
  const walk = (folder) => {
    for (const entry of readdirSync(join(root, folder), { withFileTypes: true }).sort((a, b) => (a.name < b.name ? -1 : 1))) {
      const path = `${folder}/${entry.name}`;
      if (entry.isDirectory()) {
        if (!NOT_BUILT.has(path)) walk(path);
      } else if (entry.isFile()) add(path);
    }
  };
  for (const name of readdirSync(root).sort()) if (/\.(ts|mjs|cjs|json)$/.test(name) && name !== "next-env.d.ts") add(name);
  for (const room of ROOMS) if (existsSync(join(root, room))) walk(room);
  return hash.digest("hex");
}

/**
 * Builds the application unless the last build was of the same sources.
 * @param {{ root: string, dataFolder: string, logFolder: string, distDir: string, env: Record<string, string> }} place
 *   `distDir`: where the build goes, from the root.
 * @returns {Promise<string>} what came of it.
 */
export async function buildApplication({ root, dataFolder, logFolder, distDir, env }) {
  const note = join(dataFolder, "build.json");
  const sources = hashSources(root);
  if (existsSync(join(root, distDir, "BUILD_ID")) && readNote(note) === sources) return "up to date";
  rmSync(note, { force: true });
  mkdirSync(logFolder, { recursive: true });
  const log = join(logFolder, "build.log");
  const file = openSync(log, "w");
  const { code } = await run(process.execPath, ["node_modules/next/dist/bin/next", "build"], { cwd: root, env, log: file });
  closeSync(file);
  if (code !== 0) throw new Told(`The application could not be built. The last lines of ${log}:\n${lastLines(log, 40)}`);
  writeFileSync(note, JSON.stringify({ sources }));
  return "built";
}

function readNote(path) {
  try {
    return JSON.parse(readFileSync(path, "utf8")).sources;
  } catch {
    return undefined;
  }
}
