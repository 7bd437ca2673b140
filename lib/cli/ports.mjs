import { mkdirSync, readFileSync, writeFileSync } from "node:fs";
import { createServer } from "node:net";
import { join } from "node:path";
import { Told } from "./told.mjs";

/**
 * Whether nobody listens at this port of the loopback.
 * @param {number} port
 * @returns {Promise<boolean>}
 */
export function isPortFree(port) {
  return new Promise((resolve) => {
    const probe = createServer();
    probe.once("error", () => resolve(false));
    probe.listen({ port, host: "127.0.0.1", exclusive: true }, () => probe.close(() => resolve(true)));
  });
}

/**
 * Chooses a port for each name: the remembered one, else the usual one, else the next free one ten further on, so that a second
 * copy's ports stand together.
 * @param {Record<string, number>} usual
 * @param {Record<string, number>} remembered
 * @param {(port: number) => Promise<boolean>} [isFree]
 * @returns {Promise<Record<string, number>>}
 */
export async function choosePorts(usual, remembered, isFree = isPortFree) {
  const chosen = {};
  const taken = new Set();
  for (const [name, first] of Object.entries(usual)) {
    const candidates = [...(remembered[name] ? [remembered[name]] : []), ...Array.from({ length: 100 }, (_, index) => first + index * 10)];
    for (const port of candidates) {
      if (taken.has(port) || !(await isFree(port))) continue;
      chosen[name] = port;
      taken.add(port);
      break;
    }
    if (!chosen[name]) throw new Told(`No free port was found for the ${name}: tried ${first} and 99 others. Stop some programs and start again.`);
  }
  return chosen;
}

const fileOf = (folder) => join(folder, "ports.json");

/**
 * The ports that this data folder used last.
 * @param {string} folder
 * @returns {Record<string, number>}
 */
export function readPorts(folder) {
  try {
    return JSON.parse(readFileSync(fileOf(folder), "utf8"));
  } catch {
    return {};
  }
}

/**
 * Keeps ports for the next start.
 * @param {string} folder
 * @param {Record<string, number>} ports
 */
export function keepPorts(folder, ports) {
  mkdirSync(folder, { recursive: true });
  writeFileSync(fileOf(folder), `${JSON.stringify({ ...readPorts(folder), ...ports }, null, 2)}\n`);
}
