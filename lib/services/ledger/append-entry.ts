import { randomBytes } from "node:crypto";
import type { Knex } from "knex";
import { insertErasableValues, insertLedgerEntry, nextLeafIndex } from "@/db/queries/ledger";
import { canonicalJson } from "@/lib/core/ledger/canonical-json";
import type { LedgerKind } from "@/lib/core/ledger/entry";
import { leafHash } from "@/lib/core/ledger/merkle";
import { saltedHash } from "@/lib/core/ledger/salted-hash";

export type NewEntry = {
  kind: LedgerKind;
  /** What the entry says, without anything personal: ids, numbers, hashes, outcomes. */
  subject: Record<string, unknown>;
  /** Personal values: the entry holds their salted hashes, the values stand beside it where they can be erased. */
  personal: { personId: string; label: string; value: string }[];
};

/** Version of the entry's own shape, so that a checker of later years knows what it reads. */
const ENTRY_VERSION = 1;

/**
 * Appends one entry to the organisation's tree, in the caller's transaction: it stands exactly when what it records does.
 * @returns the leaf's index
 */
export async function appendEntry(trx: Knex.Transaction, organisationId: string, entry: NewEntry): Promise<number> {
  const leafIndex = await nextLeafIndex(trx, organisationId);
  const personal = entry.personal.map((value) => ({ ...value, salt: randomBytes(32).toString("hex") }));
  const canonical = canonicalJson({
    version: ENTRY_VERSION,
    organisationId,
    leafIndex,
    kind: entry.kind,
    recordedAt: new Date().toISOString(),
    subject: entry.subject,
    personal: Object.fromEntries(personal.map(({ label, value, salt }) => [label, saltedHash(salt, value)])),
  });
  await insertLedgerEntry(trx, { organisationId, leafIndex, kind: entry.kind, canonical, leafHash: leafHash(canonical) });
  await insertErasableValues(trx, { organisationId, leafIndex }, personal);
  return leafIndex;
}
