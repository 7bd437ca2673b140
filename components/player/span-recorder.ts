import type { Span } from "@/lib/core/coverage/spans";

/** A jump of the clock larger than this between two looks is a seek, not play. */
const LARGEST_STEP_MS = 1500;

/** Gathers what is really played, look by look. Hidden pages do not count. Nothing here decides: the server accepts or cuts. */
export class SpanRecorder {
  #open: [number, number] | null = null;
  #closed: Span[] = [];

  /** Called often while playing. @param atMs where the picture is now */
  look(atMs: number, counts: boolean): void {
    const at = Math.round(atMs);
    const open = this.#open;
    if (!counts) {
      this.#close();
    } else if (open && at >= open[1] && at - open[1] <= LARGEST_STEP_MS) {
      open[1] = at;
    } else {
      this.#close();
      this.#open = [at, at];
    }
  }

  /** Takes out everything gathered so far; play goes on in a new span from the same place. */
  take(): Span[] {
    const at = this.#open?.[1];
    this.#close();
    if (at !== undefined) this.#open = [at, at];
    const spans = this.#closed;
    this.#closed = [];
    return spans;
  }

  /** Puts back what could not be sent. */
  putBack(spans: readonly Span[]): void {
    this.#closed.unshift(...spans);
  }

  /** Everything gathered and not yet sent, for showing how far it goes. */
  pending(): Span[] {
    return this.#open && this.#open[1] > this.#open[0] ? [...this.#closed, [...this.#open]] : [...this.#closed];
  }

  #close(): void {
    if (this.#open && this.#open[1] > this.#open[0]) this.#closed.push([...this.#open]);
    this.#open = null;
  }
}
