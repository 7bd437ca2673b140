import { randomBytes } from "node:crypto";
import { mkdirSync, readFileSync, renameSync, writeFileSync } from "node:fs";
import { join } from "node:path";

/**
 * @typedef {{ instance: string, superuserPassword: string, ownerPassword: string, appPassword: string,
 *   sessionSecret: string, storeKeyId: string, storeSecret: string }} Secrets
 */

/**
 * What this installation made up for itself, the same at every start. Only the person who runs it can read the file.
 * @param {string} folder  data folder; made when missing.
 * @returns {Secrets}
 */
export function readSecrets(folder) {
  mkdirSync(folder, { recursive: true });
  const path = join(folder, "secrets.json");
  let kept = {};
  try {
    kept = JSON.parse(readFileSync(path, "utf8"));
  } catch {
    // First start, or one that was cut off while writing: the cluster's instance then tells that it belongs to nobody.
  }
  const hex = (bytes) => randomBytes(bytes).toString("hex");
  const secrets = {
    instance: hex(8),
    superuserPassword: hex(24),
    ownerPassword: hex(24),
    appPassword: hex(24),
    sessionSecret: hex(32),
    storeKeyId: `WL${hex(9).toUpperCase()}`,
    storeSecret: hex(24),
    ...kept,
  };
  if (Object.keys(secrets).some((name) => !(name in kept))) {
    writeFileSync(`${path}.new`, `${JSON.stringify(secrets, null, 2)}\n`, { mode: 0o600 });
    renameSync(`${path}.new`, path);
  }
  return secrets;
}
