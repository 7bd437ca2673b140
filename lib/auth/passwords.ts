import { hash, verify } from "@node-rs/argon2";

// Argon2id with 19 MiB, two passes, one lane: a published minimum of general password-storage guidance (from memory).
const COST = { memoryCost: 19_456, timeCost: 2, parallelism: 1 };

/** An argon2id hash, in its own text form with salt and cost. */
export function hashPassword(password: string): Promise<string> {
  return hash(password.normalize("NFKC"), COST);
}

let spare: Promise<string> | undefined;

/** Whether `password` fits. With no hash it takes as long and says no, so that nobody learns which addresses exist. */
export async function verifyPassword(storedHash: string | null, password: string): Promise<boolean> {
  spare ??= hashPassword("a password that nobody has");
  const fits = await verify(storedHash ?? (await spare), password.normalize("NFKC"));
  return fits && storedHash !== null;
}
