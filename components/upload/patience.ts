import { ApiProblem } from "@/components/api/client";

const FIRST_PAUSE_MS = 1000;
const LONGEST_PAUSE_MS = 30_000;

/** Whether trying again may help: the connection is down, or the other side is out of order for the moment. */
export function mayPass(error: unknown): boolean {
  return !(error instanceof ApiProblem) || error.status === 0 || error.status === 429 || error.status >= 500;
}

/** Longer each time, never all at the same moment, over at once when the device says that it is connected again. */
export function pause(attempt: number, signal: AbortSignal): Promise<void> {
  const ms = Math.min(LONGEST_PAUSE_MS, FIRST_PAUSE_MS * 2 ** attempt) * (0.75 + Math.random() / 2);
  return new Promise((resolve, reject) => {
    const end = (finish: () => void) => () => {
      clearTimeout(timer);
      signal.removeEventListener("abort", refuse);
      globalThis.removeEventListener?.("online", go);
      finish();
    };
    const go = end(resolve);
    const refuse = end(() => reject(signal.reason));
    const timer = setTimeout(go, ms);
    globalThis.addEventListener?.("online", go);
    signal.addEventListener("abort", refuse);
    if (signal.aborted) refuse();
  });
}

/** Asks until there is an answer or a refusal. */
export async function persist<T>(ask: () => Promise<T>, signal: AbortSignal, onTrouble: (isInTrouble: boolean) => void): Promise<T> {
  for (let attempt = 0; ; attempt += 1) {
    try {
      const answer = await ask();
      if (attempt > 0) onTrouble(false);
      return answer;
    } catch (error) {
      signal.throwIfAborted();
      if (!mayPass(error)) throw error;
      onTrouble(true);
      await pause(attempt, signal);
    }
  }
}
