import { readdirSync } from "node:fs";

/** Files below a folder whose path ends so, as paths from the project's root. */
export function filesBelow(folder: string, ending: RegExp): string[] {
  return readdirSync(folder, { recursive: true, encoding: "utf8" })
    .map((name) => `${folder}/${name}`)
    .filter((path) => ending.test(path))
    .toSorted();
}
