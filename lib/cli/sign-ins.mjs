import { readFileSync } from "node:fs";
import { join } from "node:path";

/** @typedef {{ role: string, name: string, email: string, password: string, organisation: string }} SignIn */

/**
 * One sign-in per role of the demo.
 * @param {string} root
 * @returns {SignIn[]}
 */
export const readSignIns = (root) => JSON.parse(readFileSync(join(root, "db/seeds/demo/sign-ins.json"), "utf8"));

/**
 * The sign-ins as a table for the terminal; one password that fits all is said once.
 * @param {SignIn[]} signIns
 */
export function describeSignIns(signIns) {
  const passwords = new Set(signIns.map(({ password }) => password));
  const width = (key) => Math.max(...signIns.map((signIn) => signIn[key].length));
  const rows = signIns.map(({ role, email, name, organisation, password }) =>
    `    ${role.padEnd(width("role"))}  ${email.padEnd(width("email"))}  ${name}, ${organisation}${passwords.size > 1 ? `  password ${password}` : ""}`);
  return [...rows, ...(passwords.size === 1 ? [`    password for all: ${[...passwords][0]}`] : [])].join("\n");
}
