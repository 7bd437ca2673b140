import type { NumberBody, OneOfBody, PutInOrderBody } from "@/lib/core/questions/types";

/** One choice is right: the first given; the server shuffles when it asks. Each entry is the choice and why it is right or wrong. */
export const oneOf = (...choices: [text: string, why: string][]): OneOfBody => ({
  kind: "one_of",
  choices: choices.map(([text, why], index) => ({ id: "abcdefgh".charAt(index), text, right: index === 0, why })),
});

/** A number with its unit. `slips` are wrong values whose cause is known, with what to say. */
export const number = (value: number, tolerance: number, unit: string, ...slips: [value: number, hint: string][]): NumberBody => ({
  kind: "number",
  unit,
  value,
  tolerance,
  slips: slips.map(([slip, hint]) => ({ value: slip, hint })),
});

/** Items in the right order, by id. `neverBefore`: pairs whose reversal can hurt someone. */
export const inOrder = (items: Record<string, string>, ...neverBefore: [string, string][]): PutInOrderBody => ({
  kind: "put_in_order",
  items: Object.entries(items).map(([id, text]) => ({ id, text })),
  neverBefore,
});
