import { randomBytes } from "node:crypto";
import type { Knex } from "knex";
import { insertErasableValues, insertLedgerEntry, nextLeafIndex } from "@/db/queries/ledger";
import { ledgerEntry, type NewEntry } from "@/lib/core/ledger/entry";

/**
 * Appends one entry to the organisation's tree, in the caller's transaction: it stands exactly when what it records does.
 * @returns the leaf's index
 */
export async function appendEntry(trx: Knex.Transaction, organisationId: string, entry: NewEntry): Promise<number> {
  const leafIndex = await nextLeafIndex(trx, organisationId);
  const personal = entry.personal.map((value) => ({ ...value, salt: randomBytes(32).toString("hex") }));
  const recordedAt = new Date().toISOString();
  const { canonical, leafHash } = ledgerEntry({ ...entry, personal }, { organisationId, leafIndex, recordedAt });
  await insertLedgerEntry(trx, { organisationId, leafIndex, kind: entry.kind, canonical, leafHash, recordedAt });
  await insertErasableValues(trx, { organisationId, leafIndex }, personal);
  return leafIndex;
}
