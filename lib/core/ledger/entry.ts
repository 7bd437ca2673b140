import { canonicalJson } from "@/lib/core/ledger/canonical-json";
import { leafHash } from "@/lib/core/ledger/merkle";
import { saltedHash } from "@/lib/core/ledger/salted-hash";

export const LEDGER_KINDS = ["sign_off", "correction", "withdrawal", "module_revision", "task_revision"] as const;
export type LedgerKind = (typeof LEDGER_KINDS)[number];

/** A value about a person: the entry holds its salted hash, the value and its salt stand beside it where they can be erased. */
export type PersonalValue = { personId: string; label: string; value: string };
export type SaltedValue = PersonalValue & { salt: string };

/** What is to be recorded: nothing personal in `subject`, only ids, numbers, hashes and outcomes. */
export type NewEntry = { kind: LedgerKind; subject: Record<string, unknown>; personal: PersonalValue[] };

/** Version of the entry's own shape, so that a checker of later years knows what it reads. */
const ENTRY_VERSION = 1;

/**
 * The entry as it stands in the ledger: its one canonical text (RFC 8785) and the hash of that text as a leaf (RFC 6962).
 * @param at.recordedAt  ISO 8601 moment in UTC
 * @throws RangeError when two personal values bear one label: the second would drop out unseen
 */
export function ledgerEntry(
  entry: { kind: LedgerKind; subject: Record<string, unknown>; personal: SaltedValue[] },
  at: { organisationId: string; leafIndex: number; recordedAt: string },
): { canonical: string; leafHash: string } {
  const labels = entry.personal.map(({ label }) => label);
  if (new Set(labels).size !== labels.length) throw new RangeError("Two personal values of one entry bear the same label.");
  const canonical = canonicalJson({
    version: ENTRY_VERSION,
    ...at,
    kind: entry.kind,
    subject: entry.subject,
    personal: Object.fromEntries(entry.personal.map(({ label, value, salt }) => [label, saltedHash(salt, value)])),
  });
  return { canonical, leafHash: leafHash(canonical) };
}
