import type { Knex } from "knex";

/** Notes that a link to set a new password was sent. */
export async function insertPasswordReset(
  trx: Knex.Transaction,
  of: { personId: string; tokenHash: string; minutes: number },
): Promise<void> {
  await trx("password_resets").insert({
    person_id: of.personId,
    token_hash: of.tokenHash,
    expires_at: trx.raw("now() + make_interval(mins => ?)", [of.minutes]),
  });
}

export type PasswordReset = { id: string; personId: string; state: "open" | "used" | "expired" };

/** Locks the link's row, so that it can be used once. */
export async function lockPasswordResetByToken(trx: Knex.Transaction, tokenHash: string): Promise<PasswordReset | undefined> {
  const row = await trx("password_resets")
    .select(
      "id",
      "person_id",
      trx.raw(`CASE WHEN used_at IS NOT NULL THEN 'used' WHEN expires_at <= now() THEN 'expired' ELSE 'open' END AS state`),
    )
    .where({ token_hash: tokenHash })
    .forUpdate()
    .first();
  return row && { id: row.id, personId: row.person_id, state: row.state };
}

/** Closes every link that the person still has, the one just used among them. */
export async function closePasswordResetsOf(trx: Knex.Transaction, personId: string): Promise<void> {
  await trx("password_resets").where({ person_id: personId }).whereNull("used_at").update({ used_at: trx.fn.now() });
}
