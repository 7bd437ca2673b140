import type { Knex } from "knex";
import type { Db } from "@/db/client";
import type { SaltedValue } from "@/lib/core/ledger/entry";

export type LedgerRow = { leafIndex: number; kind: string; canonical: string; leafHash: string; recordedAt: Date };

/** First key of the two-part advisory lock that numbers an organisation's leaves. Nothing else may use it. */
const LEAF_NUMBERING = 0x1ed6e7;

/**
 * Takes the organisation's numbering lock until the transaction ends and says which number comes next. An advisory lock, since a row
 * lock would need the update privilege that the application's role must not have on the ledger.
 */
export async function nextLeafIndex(trx: Knex.Transaction, organisationId: string): Promise<number> {
  await trx.raw(`SELECT pg_advisory_xact_lock(?, hashtext(?))`, [LEAF_NUMBERING, organisationId]);
  const row = await trx("ledger_entries").max("leaf_index as last").where({ organisation_id: organisationId }).first();
  return row?.last === null || row?.last === undefined ? 0 : Number(row.last) + 1;
}

export async function insertLedgerEntry(
  trx: Knex.Transaction,
  entry: { organisationId: string; leafIndex: number; kind: string; canonical: string; leafHash: string; recordedAt: string },
): Promise<void> {
  await trx("ledger_entries").insert({
    organisation_id: entry.organisationId,
    leaf_index: entry.leafIndex,
    kind: entry.kind,
    canonical: entry.canonical,
    leaf_hash: entry.leafHash,
    recorded_at: entry.recordedAt,
  });
}

/** Keeps personal values beside an entry whose canonical form holds only their salted hashes. */
export async function insertErasableValues(
  trx: Knex.Transaction,
  entry: { organisationId: string; leafIndex: number },
  values: SaltedValue[],
): Promise<void> {
  if (values.length === 0) return;
  await trx("erasable_values").insert(
    values.map((value) => ({
      organisation_id: entry.organisationId,
      leaf_index: entry.leafIndex,
      person_id: value.personId,
      label: value.label,
      value: value.value,
      salt: value.salt,
    })),
  );
}

/** Leaf hashes of one organisation's tree in order: what a root and a proof are computed from. */
export async function listLeafHashes(db: Db, organisationId: string): Promise<string[]> {
  const rows = await db("ledger_entries").select("leaf_hash").where({ organisation_id: organisationId }).orderBy("leaf_index");
  return rows.map((row) => row.leaf_hash);
}

export async function findLedgerEntry(db: Db, organisationId: string, leafIndex: number): Promise<LedgerRow | undefined> {
  const row = await db("ledger_entries")
    .select("leaf_index", "kind", "canonical", "leaf_hash", "recorded_at")
    .where({ organisation_id: organisationId, leaf_index: leafIndex })
    .first();
  return row && { leafIndex: row.leaf_index, kind: row.kind, canonical: row.canonical, leafHash: row.leaf_hash, recordedAt: row.recorded_at };
}
