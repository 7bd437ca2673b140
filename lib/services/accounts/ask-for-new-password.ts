import { setTimeout as wait } from "node:timers/promises";
import { getDb } from "@/db/client";
import { insertPasswordReset } from "@/db/queries/password-resets";
import { findPersonByEmail } from "@/db/queries/people";
import { countHit } from "@/db/queries/rate-limits";
import { AppError } from "@/lib/core/errors";
import { passwordResetLetter } from "@/lib/core/letters/password-reset";
import { postLetter } from "@/lib/jobs/post-letter";
import { linkTo, newToken } from "@/lib/services/accounts/single-use-link";

const HOLDS_MINUTES = 60;
/** Letters an hour to one address; counted whether anybody has it or not. */
const ASKS = { limit: 4, windowSeconds: 3600 };
/** Longer than writing a letter takes, so that the time of the answer doesn't say whether one was written. */
const AT_LEAST_MS = 400;

/**
 * Sends a link to set a new password, if somebody has this address. The answer, and the time it takes, is the same if nobody does.
 * @param email  lower case
 * @throws AppError("too_many")
 */
export async function askForNewPassword(email: string): Promise<{ asked: true }> {
  if (!(await countHit(getDb(), `new-password:${email}`, ASKS))) {
    throw new AppError("too_many", "That address was asked for several times within the hour. Look for the letter, or try again later.");
  }
  await Promise.all([sendLink(email), wait(AT_LEAST_MS)]);
  return { asked: true };
}

async function sendLink(email: string): Promise<void> {
  await getDb().transaction(async (trx) => {
    const person = await findPersonByEmail(trx, email);
    if (!person || person.suspendedAt) return;
    const { token, tokenHash } = newToken();
    await insertPasswordReset(trx, { personId: person.id, tokenHash, minutes: HOLDS_MINUTES });
    const address = linkTo("/new-password", token);
    await postLetter(trx, passwordResetLetter({ to: email, name: person.name, address, minutes: HOLDS_MINUTES }));
  });
}
