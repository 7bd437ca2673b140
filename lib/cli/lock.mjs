import { mkdirSync, readdirSync, rmSync, writeFileSync } from "node:fs";
import { join } from "node:path";
import { identify, isAlive } from "./process-identity.mjs";
import { Told } from "./told.mjs";

/**
 * Lets one copy at a time work on a data folder. Each copy first puts down its own claim and then looks for others, so that of two
 * that start together at least one sees the other; claims of processes that ended are swept away.
 * @param {string} dataFolder
 * @param {string} [self]  identity of the claiming process.
 * @returns {() => void}  gives the folder free again.
 */
export function lockDataFolder(dataFolder, self = identify(process.pid)) {
  const folder = join(dataFolder, "running");
  mkdirSync(folder, { recursive: true });
  const claim = join(folder, self);
  const release = () => rmSync(claim, { force: true });
  writeFileSync(claim, "");
  for (const other of readdirSync(folder)) {
    if (other === self) continue;
    if (isAlive(other)) {
      release();
      throw new Told(`Another copy already works on ${dataFolder} (process ${Number.parseInt(other, 10)}). Stop it first, or use it.`);
    }
    rmSync(join(folder, other), { force: true });
  }
  return release;
}
