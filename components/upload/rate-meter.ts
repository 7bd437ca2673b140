const HALF_LIFE_MS = 8000;
const BUCKET_MS = 1000;
const FIRST_WORD_AFTER_MS = 3000;

/** How fast bytes go and how long the rest will take, steady enough to be read: one bad second doesn't make it jump. */
export class RateMeter {
  readonly #totalBytes: number;
  #last: { bytes: number; atMs: number };
  #measuredMs = 0;
  #rate = 0;
  #left: { ms: number; atMs: number } | null = null;

  constructor(totalBytes: number, sentBytes: number, nowMs: number) {
    this.#totalBytes = totalBytes;
    this.#last = { bytes: sentBytes, atMs: nowMs };
  }

  /** Notes how many bytes of the whole have gone by now; a part that is sent again makes it fewer. */
  note(sentBytes: number, nowMs: number): void {
    const elapsedMs = nowMs - this.#last.atMs;
    if (elapsedMs < BUCKET_MS) return;
    const rate = Math.max(0, sentBytes - this.#last.bytes) / elapsedMs;
    // A mean in which a second counts half as much every eight seconds; at first, simply the mean.
    const kept = Math.min(0.5 ** (elapsedMs / HALF_LIFE_MS), this.#measuredMs / (this.#measuredMs + elapsedMs));
    this.#rate = this.#rate * kept + rate * (1 - kept);
    this.#measuredMs += elapsedMs;
    this.#last = { bytes: sentBytes, atMs: nowMs };
    this.#settle(sentBytes, nowMs);
  }

  #settle(sentBytes: number, nowMs: number): void {
    if (this.#measuredMs < FIRST_WORD_AFTER_MS || this.#rate === 0) return;
    const estimate = (this.#totalBytes - sentBytes) / this.#rate;
    if (!this.#left) this.#left = { ms: estimate, atMs: nowMs };
    else {
      // What was said runs down by itself; it is led towards the new estimate a fifth at a time.
      const said = Math.max(0, this.#left.ms - (nowMs - this.#left.atMs));
      this.#left = { ms: said + (estimate - said) * 0.2, atMs: nowMs };
    }
  }

  /** Milliseconds until the last byte has gone, or null while that would be a guess. */
  get leftMs(): number | null {
    return this.#left && this.#left.ms;
  }
}

/** Time left in words as coarse as the estimate is. */
export function formatLeft(ms: number): string {
  const seconds = ms / 1000;
  if (seconds < 10) return "a few seconds left";
  if (seconds < 55) return `about ${Math.round(seconds / 10) * 10} s left`;
  const minutes = Math.max(1, Math.round(seconds / 60));
  if (minutes < 60) return `about ${minutes} min left`;
  return `about ${Math.floor(minutes / 60)} h ${minutes % 60} min left`;
}
