import type { PutInOrderBody } from "@/lib/core/questions/types";

/** A "put in order" of the steps as the film shows them; steps without a name are left out. Ids are the steps' own: they are hidden when it is asked. */
export function putInOrderFromSteps(steps: readonly { id: string; title: string; startMs: number }[]): PutInOrderBody {
  const named = steps.filter(({ title }) => title.trim() !== "").toSorted((a, b) => a.startMs - b.startMs);
  return { kind: "put_in_order", items: named.map(({ id, title }) => ({ id, text: title.trim() })), neverBefore: [] };
}

/**
 * The same backwards: refitting is the reverse of removal (common practice, no source; the new part is compared with the old before it
 * goes in, which the author adds). What must never come before what is not carried over: other things hurt on the way back.
 */
export function reversedForRefitting(body: PutInOrderBody): PutInOrderBody {
  return { kind: "put_in_order", items: body.items.toReversed(), neverBefore: [] };
}
