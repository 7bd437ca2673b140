import type { Db } from "@/db/client";
import { listProgressFacts, listSignOffFacts, type ProgressFact, type SignOffFact } from "@/db/reads/standing-facts";
import { standingOf } from "@/lib/core/standing/standing-of";
import type { Standing } from "@/lib/core/standing/types";
import { today } from "@/lib/services/clock";

/** A person's standing on a task with the facts it was computed from. */
export type KnownStanding = { standing: Standing; progress: ProgressFact; decisions: SignOffFact[] };

export type Standings = {
  /** Always there for a pair that was asked for. */
  of: (apprenticeId: string, taskId: string) => KnownStanding;
};

const pairKey = (pair: { apprenticeId: string; taskId: string }): string => `${pair.apprenticeId} ${pair.taskId}`;

/** Standings of these people on these tasks: two queries, however many there are. Who may see them is the caller's to check. */
export async function listStandings(db: Db, apprenticeIds: string[], taskIds: string[]): Promise<Standings> {
  const scope = { apprenticeIds, taskIds };
  const decisions = new Map<string, SignOffFact[]>();
  for (const fact of await listSignOffFacts(db, scope)) {
    const list = decisions.get(pairKey(fact)) ?? [];
    list.push(fact);
    decisions.set(pairKey(fact), list);
  }
  const day = today();
  const known = new Map<string, KnownStanding>();
  for (const progress of await listProgressFacts(db, scope)) {
    const made = decisions.get(pairKey(progress)) ?? [];
    const { readySince, bookedFor } = progress;
    const standing = standingOf(made, { ...progress, isReady: readySince !== null, isBooked: bookedFor !== null }, day);
    known.set(pairKey(progress), { standing, progress, decisions: made });
  }
  return {
    of: (apprenticeId, taskId) => {
      const found = known.get(pairKey({ apprenticeId, taskId }));
      if (!found) throw new Error("That standing was not asked for.");
      return found;
    },
  };
}
