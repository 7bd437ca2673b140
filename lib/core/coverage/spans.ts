/** A played stretch [startMs, endMs) in whole ms on the recording's axis. */
export type Span = readonly [startMs: number, endMs: number];

/** The same ground without overlaps, in order; empty and backward spans and what is no number are dropped, touching ones joined. */
export function unionSpans(spans: readonly Span[]): Span[] {
  const united: [number, number][] = [];
  for (const [start, end] of spans.filter(([start, end]) => end > start).toSorted((a, b) => a[0] - b[0])) {
    const last = united.at(-1);
    if (last && start <= last[1]) last[1] = Math.max(last[1], end);
    else united.push([start, end]);
  }
  return united;
}

/** Length of the united spans inside [startMs, endMs). */
export function coveredMs(spans: readonly Span[], startMs: number, endMs: number): number {
  return unionSpans(spans).reduce((sum, [from, to]) => sum + Math.max(0, Math.min(to, endMs) - Math.max(from, startMs)), 0);
}

/** Share of a step that was played, 0–1; 0 of a step without length. Never rounded: 0.9499 is not 0.95. */
export function seenShare(spans: readonly Span[], step: { startMs: number; endMs: number }): number {
  const lengthMs = step.endMs - step.startMs;
  return lengthMs > 0 ? coveredMs(spans, step.startMs, step.endMs) / lengthMs : 0;
}

/** A little more than the clock says: reports travel, and a player's clock and ours never quite agree. At most this much a report, … */
export const ALLOWANCE_MS = 3000;
/** A player reports every few seconds; whoever was silent for longer than this was not playing all that time. */
export const LONGEST_GAP_MS = 15 * 60_000;
/** … and at most this share of the time that passed: a report that is sent over and over earns nothing. */
const ALLOWANCE_SHARE = 0.5;
/** The fastest rate that the player offers. */
export const MAX_RATE = 2;
/** The slowest one that is believed. */
const MIN_RATE = 0.25;

/**
 * What the server accepts of a report: never more than could have been played since the last one, that is time passed × rate and a small
 * allowance. Spans are united and clipped to the recording, then taken in order until the time is used up; the one that goes over is cut.
 * @param of.reported   played stretches in ms, in any order; what is no stretch is passed over
 * @param of.elapsedMs  wall time since the person's last report from any tab or device, by the server's clock; at most LONGEST_GAP_MS of it counts
 * @param of.rate       claimed rate of play; held to 0.25–MAX_RATE
 * @returns spans in whole ms, in order, without overlap
 */
export function acceptSpans(of: { reported: readonly Span[]; durationMs: number; elapsedMs: number; rate: number }): Span[] {
  const passedMs = of.elapsedMs > 0 ? Math.min(of.elapsedMs, LONGEST_GAP_MS) : 0;
  const rate = Math.min(MAX_RATE, Math.max(MIN_RATE, Number.isFinite(of.rate) ? of.rate : 1));
  let left = Math.floor(passedMs * rate + Math.min(ALLOWANCE_MS, passedMs * ALLOWANCE_SHARE));
  const accepted: Span[] = [];
  const clipped = of.reported.map(([start, end]): Span => [Math.max(0, Math.ceil(start)), Math.min(of.durationMs, Math.floor(end))]);
  for (const [start, end] of unionSpans(clipped)) {
    const taken = Math.min(end - start, left);
    if (taken <= 0) break;
    accepted.push([start, start + taken]);
    left -= taken;
  }
  return accepted;
}

/**
 * How far a learner may go in a recording: to the end of what was played without a gap from `fromMs`, and a moment more. Going back is free.
 */
export function furthestAllowed(played: readonly Span[], fromMs: number, slackMs = 1500): number {
  let reach = fromMs;
  for (const [start, end] of unionSpans(played)) {
    if (start > reach + slackMs) break;
    reach = Math.max(reach, end);
  }
  return reach + slackMs;
}
