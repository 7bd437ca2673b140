import type { Held, Next, Standing } from "@/lib/core/standing/types";
import type { Level, Outcome } from "@/lib/core/tasks/types";

/** One signed decision, with what happened to it since. Days are yyyy-mm-dd. */
export type SignedDecision = {
  outcome: Outcome;
  level: Level | null;
  signedOn: string;
  currentUntil: string | null;
  withdrawn: boolean;
  /** A later revision of the task, or of a module that opens it, said that the work changed. */
  workChangedSince: boolean;
};

export type Progress = {
  hasModule: boolean;
  knowledgeMet: boolean;
  practiceRuns: number;
  evidencePhotos: number;
  isReady: boolean;
  isBooked: boolean;
};

/**
 * A person's standing on a task: what is held, and how far the next observation is.
 * @param decisions  every signed decision, oldest first
 * @param today      yyyy-mm-dd; a sign-off is current up to and including its last day
 */
export function standingOf(decisions: SignedDecision[], progress: Progress, today: string): Standing {
  return { held: heldFrom(decisions, today), next: nextFrom(decisions, progress) };
}

/** The newest met decision holds, until it runs out, the work changes, or it is withdrawn; an older one doesn't come back by itself. */
function heldFrom(decisions: SignedDecision[], today: string): Held {
  const newest = decisions.filter((decision) => decision.outcome === "met").at(-1);
  if (!newest || newest.level === null) return { kind: "nothing" };
  const { level } = newest;
  if (newest.withdrawn) return { kind: "withdrawn", level };
  if (newest.workChangedSince) return { kind: "recheck_due", level, because: "work_changed" };
  if (newest.currentUntil === null || newest.currentUntil < today) return { kind: "recheck_due", level, because: "expired" };
  return { kind: "level", level, until: newest.currentUntil };
}

function nextFrom(decisions: SignedDecision[], progress: Progress): Next {
  if (progress.hasModule && !progress.knowledgeMet) return "not_open";
  if (progress.isBooked) return "booked";
  if (progress.isReady) return "ready";
  const last = decisions.filter((decision) => !decision.withdrawn).at(-1);
  if (last?.outcome === "not_yet") return "not_yet";
  // What was practised before the last sign-off led to it; a held level starts the next round anew.
  if (last === undefined && (progress.practiceRuns > 0 || progress.evidencePhotos > 0)) return "practising";
  return "open";
}
