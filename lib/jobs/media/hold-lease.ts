import { getDb } from "@/db/client";
import { LEASE_SECONDS, renewLease, type ClaimedStage } from "@/db/queries/recording-stages";

const LOOK_EVERY_MS = 1000;
const SIGN_OF_LIFE_EVERY_MS = (LEASE_SECONDS * 1000) / 5;

export type HeldLease = {
  /** Raised when somebody else has taken the stage over, or the database can't be told that we live. */
  signal: AbortSignal;
  onPercent: (percent: number) => void;
  /** No more signs of life; waits for one under way. */
  stop(): Promise<void>;
};

/** Gives signs of life for a stage while it is worked on, with how far the work is. */
export function holdLease(claim: ClaimedStage): HeldLease {
  const lost = new AbortController();
  let percent = 0;
  let told = { percent: 0, atMs: Date.now() };
  let renewing: Promise<void> = Promise.resolve();

  async function renew(): Promise<void> {
    const next = { percent: Math.floor(percent), atMs: Date.now() };
    try {
      if (!(await renewLease(getDb(), claim, next.percent))) lost.abort(new Error("Another worker has taken this stage over."));
      told = next;
    } catch (error) {
      if (Date.now() - told.atMs > LEASE_SECONDS * 1000) lost.abort(error);
    }
  }

  let isRenewing = false;
  const timer = setInterval(() => {
    const isDue = Math.floor(percent) !== told.percent || Date.now() - told.atMs > SIGN_OF_LIFE_EVERY_MS;
    if (isRenewing || !isDue) return;
    isRenewing = true;
    renewing = renew().finally(() => (isRenewing = false));
  }, LOOK_EVERY_MS);

  return {
    signal: lost.signal,
    onPercent: (next) => (percent = Math.max(percent, next)),
    async stop() {
      clearInterval(timer);
      await renewing;
    },
  };
}
