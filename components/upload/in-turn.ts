/**
 * Does the work when no other tab is at it. A tab that is closed or dies gives its turn away by itself.
 * @param onElsewhere  called if another tab has the turn, before waiting for it; stops being true when the work begins
 */
export async function inTurn<T>(name: string, signal: AbortSignal, onElsewhere: () => void, work: () => Promise<T>): Promise<T> {
  const locks = (globalThis.navigator as Navigator | undefined)?.locks;
  // Only in a secure context; elsewhere two tabs would send the same parts twice, which costs time and harms nothing.
  if (!locks) return work();
  const free = await locks.request(name, { ifAvailable: true }, async (lock) => (lock ? { result: await work() } : undefined));
  if (free) return free.result;
  onElsewhere();
  return (await locks.request(name, { signal }, work)) as T;
}
