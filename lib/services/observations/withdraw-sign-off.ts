import { getDb } from "@/db/client";
import { findSignOffParties, insertSignOffChange, isWithdrawn } from "@/db/queries/sign-offs";
import { assertAllowed } from "@/lib/core/decision";
import { AppError } from "@/lib/core/errors";
import type { Actor } from "@/lib/core/roles";
import { canWithdrawSignOff } from "@/lib/policies/observations";
import type { WithdrawSignOffInput } from "@/lib/schemas/observations";
import { confirmPassword } from "@/lib/services/accounts/confirm-password";
import { appendEntry } from "@/lib/services/ledger/append-entry";

/**
 * Withdraws a sign-off by a further entry with its reason; the sign-off itself is never touched.
 * @throws AppError("forbidden" | "not_found" | "conflict" when it was withdrawn already | "too_many")
 */
export async function withdrawSignOff(actor: Actor, signOffId: string, input: WithdrawSignOffInput): Promise<{ withdrawn: true }> {
  await confirmPassword(getDb(), actor.personId, input.password);
  const organisationId = actor.organisation.id;
  return getDb().transaction(async (trx) => {
    const signOff = await findSignOffParties(trx, organisationId, signOffId);
    if (!signOff) throw new AppError("not_found", "There is no such sign-off.");
    assertAllowed(canWithdrawSignOff(actor, signOff));
    // The ledger's numbering lock comes first, so that of two at once the second sees what the first wrote.
    const leafIndex = await appendEntry(trx, organisationId, {
      kind: "withdrawal",
      subject: { signOffId, taskId: signOff.taskId },
      personal: [
        { personId: actor.personId, label: "withdrawn_by", value: actor.name },
        { personId: signOff.apprenticeId, label: "reason", value: input.reason },
      ],
    });
    if (await isWithdrawn(trx, signOffId)) throw new AppError("conflict", "This sign-off was withdrawn already.");
    await insertSignOffChange(trx, { organisationId, signOffId, kind: "withdrawal", reason: input.reason, madeBy: actor.personId, leafIndex });
    return { withdrawn: true };
  });
}
