import { existsSync, statfsSync } from "node:fs";
import { dirname, resolve } from "node:path";
import { Told } from "./told.mjs";

const NEEDED_BYTES = 1.5 * 1024 ** 3;

/** @param {{ bavail: number, bsize: number }} disk  as statfs tells it. @param {string} folder */
export function judgeDisk({ bavail, bsize }, folder) {
  const freeBytes = bavail * bsize;
  if (freeBytes >= NEEDED_BYTES) return `${(freeBytes / 1024 ** 3).toFixed(0)} GB free`;
  throw new Told(`Only ${(freeBytes / 1024 ** 3).toFixed(1)} GB are free where ${folder} lies; Witnessline needs 1.5 GB. Make room and start again.`);
}

/**
 * Looks whether there is room, before half of something is written.
 * @param {string[]} folders  they need not exist yet.
 */
export function checkDisk(folders) {
  const outcomes = folders.map((folder) => {
    let there = resolve(folder);
    while (!existsSync(there)) there = dirname(there);
    return judgeDisk(statfsSync(there), folder);
  });
  return outcomes[0];
}
