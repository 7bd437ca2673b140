import { getDb } from "@/db/client";
import { closePasswordResetsOf, lockPasswordResetByToken } from "@/db/queries/password-resets";
import { findPersonWithSecret, setPasswordHash } from "@/db/queries/people";
import { endSessionsOf } from "@/db/queries/sessions";
import { hashPassword } from "@/lib/auth/passwords";
import { AppError } from "@/lib/core/errors";
import { passwordChangedLetter } from "@/lib/core/letters/password-reset";
import { env } from "@/lib/env";
import { postLetter } from "@/lib/jobs/post-letter";
import type { SetPasswordInput } from "@/lib/schemas/accounts";
import { assertGoodPassword } from "@/lib/services/accounts/assert-good-password";
import { hashToken } from "@/lib/services/accounts/single-use-link";

/**
 * Sets a new password with a link from a letter. Ends every session of the person and every other such link.
 * @returns the address to sign in with
 * @throws AppError("gone" | "invalid_input" for a poor password; the link then still works)
 */
export async function setNewPassword(input: SetPasswordInput): Promise<{ email: string }> {
  return getDb().transaction(async (trx) => {
    const reset = await lockPasswordResetByToken(trx, hashToken(input.token));
    if (reset?.state !== "open") {
      const why = reset ? (reset.state === "used" ? "was used already, and it works once" : "has expired: it holds for an hour") : "is not valid";
      throw new AppError("gone", `This link ${why}. Ask for a new one.`);
    }
    const person = await findPersonWithSecret(trx, { id: reset.personId });
    if (!person || person.suspendedAt) throw new AppError("gone", "This link is not valid. Ask for a new one.");
    assertGoodPassword(input.password, [person.name, person.email]);
    await setPasswordHash(trx, person.id, await hashPassword(input.password));
    await closePasswordResetsOf(trx, person.id);
    await endSessionsOf(trx, person.id);
    await postLetter(trx, passwordChangedLetter({ to: person.email, name: person.name, address: `${env().APP_URL}/forgotten` }));
    return { email: person.email };
  });
}
