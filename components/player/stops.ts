/** A moment at which the picture must stop: a caution before its step, or a question. Times in ms on the recording's axis. */
export type Stop = { kind: "caution" | "question"; id: string; atMs: number };

/** The first stop at or after `fromMs` that is still to be dealt with; at one moment the caution comes first. */
export function nextStop(stops: readonly Stop[], done: ReadonlySet<string>, fromMs: number): Stop | undefined {
  let next: Stop | undefined;
  for (const stop of stops) {
    if (done.has(stop.id) || stop.atMs < fromMs) continue;
    if (!next || stop.atMs < next.atMs || (stop.atMs === next.atMs && stop.kind === "caution" && next.kind === "question")) next = stop;
  }
  return next;
}

/**
 * How far somebody may jump: not past what was played without a gap, nor over a stop that is still to be dealt with. Going back is free.
 */
export function heldBack(toMs: number, reachMs: number, stop: Stop | undefined): number {
  return Math.max(0, Math.min(toMs, reachMs, stop ? stop.atMs : Number.POSITIVE_INFINITY));
}
