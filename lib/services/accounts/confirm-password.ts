import type { Db } from "@/db/client";
import { findPersonWithSecret } from "@/db/queries/people";
import { countHit } from "@/db/queries/rate-limits";
import { verifyPassword } from "@/lib/auth/passwords";
import { AppError } from "@/lib/core/errors";

const GUESSES = { limit: 10, windowSeconds: 15 * 60 };

/**
 * Asks a signed-in person for their password again, before something is signed. Run outside the transaction that follows: it is slow
 * on purpose, and a wrong guess must be counted even though nothing else is written.
 * @throws AppError("too_many" | "forbidden")
 */
export async function confirmPassword(db: Db, personId: string, password: string): Promise<void> {
  if (!(await countHit(db, `confirm:${personId}`, GUESSES))) {
    throw new AppError("too_many", "Too many wrong passwords. Wait a quarter of an hour; nothing on the page is lost.");
  }
  const person = await findPersonWithSecret(db, { id: personId });
  if (!(await verifyPassword(person?.passwordHash ?? null, password))) {
    throw new AppError("forbidden", "That is not your password. Nothing was signed; try again.");
  }
}
