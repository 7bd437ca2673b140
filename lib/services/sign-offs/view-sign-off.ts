import { getDb } from "@/db/client";
import { findLedgerEntry, listLeafHashes } from "@/db/queries/ledger";
import { listMarks } from "@/db/queries/observations";
import { findSignOff, listSignOffChanges, sharesRecord, type SignOffChange, type SignOffDetail } from "@/db/reads/sign-offs";
import { assertAllowed } from "@/lib/core/decision";
import { AppError } from "@/lib/core/errors";
import { inclusionProof, leafHash, treeRoot, verifyInclusion } from "@/lib/core/ledger/merkle";
import type { Actor } from "@/lib/core/roles";
import type { Held } from "@/lib/core/standing/types";
import type { CriterionMark } from "@/lib/core/tasks/types";
import { canReadSignOff, canWithdrawSignOff } from "@/lib/policies/observations";
import { today } from "@/lib/services/clock";

export type SignOffView = {
  signOff: SignOffDetail;
  marks: CriterionMark[];
  changes: SignOffChange[];
  held: Held;
  canWithdraw: boolean;
  /** The entry in the tree as of now, recomputed: `holds` is false when anything in it was altered. */
  proof: { leafIndex: number; treeSize: number; leafHash: string; root: string; path: string[]; holds: boolean };
};

/**
 * One sign-off as it stands: what was seen, who stood there, and whether its ledger entry still proves itself.
 * @throws AppError("not_found" | "forbidden")
 */
export async function viewSignOff(actor: Actor, signOffId: string): Promise<SignOffView> {
  const db = getDb();
  const signOff = await findSignOff(db, signOffId);
  if (!signOff) throw new AppError("not_found", "There is no such sign-off.");
  const shared = await sharesRecord(db, actor.organisation.id, signOff.apprenticeId);
  assertAllowed(canReadSignOff(actor, { ...signOff, sharesRecord: shared }));

  const entry = await findLedgerEntry(db, signOff.organisationId, signOff.leafIndex);
  if (!entry) throw new Error(`Sign-off ${signOffId} has no ledger entry.`);
  const leaves = await listLeafHashes(db, signOff.organisationId);
  const path = inclusionProof(signOff.leafIndex, leaves);
  const root = treeRoot(leaves);
  // From the entry's own text, not from its stored hash: an altered text must not prove itself.
  const leaf = leafHash(entry.canonical);
  const changes = await listSignOffChanges(db, signOffId);
  return {
    signOff,
    marks: await listMarks(db, { id: signOff.observationId, startedAt: signOff.startedAt }),
    changes,
    held: heldBy(signOff, changes),
    canWithdraw:
      signOff.organisationId === actor.organisation.id && canWithdrawSignOff(actor, signOff).allowed && !changes.some((change) => change.kind === "withdrawal"),
    proof: {
      leafIndex: signOff.leafIndex,
      treeSize: leaves.length,
      leafHash: leaf,
      root,
      path,
      holds: verifyInclusion({ index: signOff.leafIndex, size: leaves.length, leaf, proof: path, root }),
    },
  };
}

/** What this one sign-off gives by itself today. */
function heldBy(signOff: SignOffDetail, changes: SignOffChange[]): Held {
  if (signOff.level === null || signOff.currentUntil === null) return { kind: "nothing" };
  if (changes.some((change) => change.kind === "withdrawal")) return { kind: "withdrawn", level: signOff.level };
  if (signOff.currentUntil < today()) return { kind: "recheck_due", level: signOff.level, because: "expired" };
  return { kind: "level", level: signOff.level, until: signOff.currentUntil };
}
