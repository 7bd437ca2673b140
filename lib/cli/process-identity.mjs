import { readFileSync } from "node:fs";

/**
 * A name for a running process that is never given twice: its number is handed out again, the number with the moment of its start is
 * not. Undefined when it doesn't run.
 * @param {number} pid
 * @returns {string | undefined}
 */
export function identify(pid) {
  try {
    process.kill(pid, 0);
  } catch (error) {
    if (error.code !== "EPERM") return undefined;
  }
  try {
    const boot = readFileSync("/proc/sys/kernel/random/boot_id", "utf8").slice(0, 8);
    const afterName = readFileSync(`/proc/${pid}/stat`, "utf8").split(") ").pop().split(" ");
    if (afterName[0] === "Z") return undefined; // ended, and only waits to be counted by its parent
    return `${pid}-${boot}-${afterName[19]}`; // field 22 of the line: start in clock ticks since boot (man proc)
  } catch {
    return `${pid}`; // no /proc on this system: the number alone has to do
  }
}

/**
 * Whether the process of this name still runs.
 * @param {string} identity
 */
export const isAlive = (identity) => identify(Number.parseInt(identity, 10)) === identity;
