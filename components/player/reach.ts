import { furthestAllowed, seenShare, type Span } from "@/lib/core/coverage/spans";
import { SEEN_SHARE } from "@/lib/core/modules/knowledge";

type ReachStep = { recordingId: string; startMs: number; endMs: number };

/** Number of steps from the first on that may be entered: every step seen to the end opens the next. */
export function reachableSteps(steps: readonly ReachStep[], played: ReadonlyMap<string, readonly Span[]>): number {
  const firstUnseen = steps.findIndex((step) => seenShare(played.get(step.recordingId) ?? [], step) < SEEN_SHARE);
  return firstUnseen === -1 ? steps.length : firstUnseen + 1;
}

/** How far into one recording somebody may go, in ms: the furthest edge of what the reachable steps let them play. */
export function reachIn(recordingId: string, steps: readonly ReachStep[], played: ReadonlyMap<string, readonly Span[]>): number {
  const spans = played.get(recordingId) ?? [];
  const open = steps.slice(0, reachableSteps(steps, played)).filter((step) => step.recordingId === recordingId);
  return Math.max(0, ...open.map((step) => Math.max(furthestAllowed(spans, step.startMs), seenShare(spans, step) >= SEEN_SHARE ? step.endMs : 0)));
}
