import { getDb } from "@/db/client";
import { findPersonByEmail, setSuspended } from "@/db/queries/people";
import { endSessionsOf } from "@/db/queries/sessions";
import { AppError } from "@/lib/core/errors";

/**
 * Shuts a person out of the whole installation, or lets them back in. Not an organisation's power, since a person may belong to several:
 * only the keeper's command calls it. Works at the next request of each of their devices.
 * @throws AppError("not_found")
 */
export async function suspendPerson(email: string, suspended: boolean): Promise<{ name: string }> {
  return getDb().transaction(async (trx) => {
    const person = await findPersonByEmail(trx, email.trim().toLowerCase());
    if (!person) throw new AppError("not_found", `Nobody here has the address ${email}.`);
    await setSuspended(trx, person.email, suspended);
    if (suspended) await endSessionsOf(trx, person.id);
    return { name: person.name };
  });
}
