import { createHash } from "node:crypto";
import type { Knex } from "knex";
import { insertErasableValues, insertLedgerEntry } from "@/db/queries/ledger";
import { ledgerEntry, type NewEntry } from "@/lib/core/ledger/entry";

/** Writes the demo's past into the ledger: entries come in the order of time, organisation by organisation, numbered from 0. */
export class LedgerWriter {
  readonly #next = new Map<string, number>();

  constructor(private readonly trx: Knex.Transaction) {}

  async append(organisationId: string, entry: NewEntry, recordedAt: string): Promise<number> {
    const leafIndex = this.#next.get(organisationId) ?? 0;
    this.#next.set(organisationId, leafIndex + 1);
    // The demo is the same every time it is loaded, salts included: there is nobody to protect in it.
    const personal = entry.personal.map((value) => ({
      ...value,
      salt: createHash("sha256").update(`demo salt ${organisationId} ${leafIndex} ${value.label}`).digest("hex"),
    }));
    const { canonical, leafHash } = ledgerEntry({ ...entry, personal }, { organisationId, leafIndex, recordedAt });
    await insertLedgerEntry(this.trx, { organisationId, leafIndex, kind: entry.kind, canonical, leafHash, recordedAt });
    await insertErasableValues(this.trx, { organisationId, leafIndex }, personal);
    return leafIndex;
  }
}
