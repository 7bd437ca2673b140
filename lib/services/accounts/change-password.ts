import { getDb } from "@/db/client";
import { closePasswordResetsOf } from "@/db/queries/password-resets";
import { findPersonWithSecret, setPasswordHash } from "@/db/queries/people";
import { countHit } from "@/db/queries/rate-limits";
import { endOtherSessionsOf } from "@/db/queries/sessions";
import { hashPassword, verifyPassword } from "@/lib/auth/passwords";
import { AppError } from "@/lib/core/errors";
import { passwordChangedLetter } from "@/lib/core/letters/password-reset";
import type { SignedIn } from "@/lib/core/roles";
import { env } from "@/lib/env";
import { postLetter } from "@/lib/jobs/post-letter";
import type { ChangePasswordInput } from "@/lib/schemas/accounts";
import { assertGoodPassword } from "@/lib/services/accounts/assert-good-password";

const TRIES = { limit: 10, windowSeconds: 15 * 60 };

/**
 * Changes the person's own password. Asks for the old one, so that an unlocked phone left on the bench is not enough. Other devices are
 * signed out; this one stays.
 * @throws AppError("forbidden" for a wrong old password | "invalid_input" for a poor new one | "too_many")
 */
export async function changePassword(signedIn: SignedIn, input: ChangePasswordInput): Promise<{ otherSessionsEnded: number }> {
  const db = getDb();
  if (!(await countHit(db, `change-password:${signedIn.personId}`, TRIES))) {
    throw new AppError("too_many", "Too many tries. Wait a quarter of an hour.");
  }
  const person = await findPersonWithSecret(db, { id: signedIn.personId });
  if (!person || !(await verifyPassword(person.passwordHash, input.current))) {
    throw new AppError("forbidden", "The old password is not right. Nothing was changed.", [
      { path: "current", message: "This is not your password." },
    ]);
  }
  if (input.next === input.current) {
    const message = "That is the password you have. Choose another one.";
    throw new AppError("invalid_input", message, [{ path: "next", message }]);
  }
  assertGoodPassword(input.next, [person.name, person.email], "next");
  const passwordHash = await hashPassword(input.next);
  return db.transaction(async (trx) => {
    await setPasswordHash(trx, person.id, passwordHash);
    await closePasswordResetsOf(trx, person.id);
    await postLetter(trx, passwordChangedLetter({ to: person.email, name: person.name, address: `${env().APP_URL}/forgotten` }));
    return { otherSessionsEnded: await endOtherSessionsOf(trx, person.id, signedIn.sessionId) };
  });
}
