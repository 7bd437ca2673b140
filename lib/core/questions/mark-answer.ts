import type { GivenAnswer, Marked, NumberBody, OneOfBody, PutInOrderBody, Question } from "@/lib/core/questions/types";
import { convert } from "@/lib/core/units/convert";
import { findUnit, UNITS } from "@/lib/core/units/units";

/**
 * Marks an answer. Ids are the question's own (see `unmapAnswer`). A known slip is named in words: the unit, a factor of ten, the sign,
 * a slip that the author listed; of an order, the first thing that stands wrong, so that it can be tried again.
 * @throws AppError("invalid_input") for a unit of another quantity
 */
export function markAnswer(question: Question, given: GivenAnswer): Marked {
  const { body } = question;
  if (body.kind === "one_of" && given.kind === "one_of") return markOneOf(body, given.choiceId);
  if (body.kind === "number" && given.kind === "number") return markNumber(body, given.value, given.unit);
  if (body.kind === "put_in_order" && given.kind === "put_in_order") return markOrder(body, given.itemIds);
  return { right: false, diagnosis: "That is an answer to another kind of question." };
}

function markOneOf(body: OneOfBody, choiceId: string): Marked {
  const choice = body.choices.find((candidate) => candidate.id === choiceId);
  if (!choice) return { right: false, diagnosis: null };
  return { right: choice.right, diagnosis: choice.why === "" ? null : choice.why };
}

/** Within the tolerance, with a hair for binary fractions: 0.05 ± 0.005 takes 0.055. */
const within = (value: number, target: number, tolerance: number): boolean =>
  Math.abs(value - target) <= tolerance + 1e-9 * Math.max(1, Math.abs(target));

function markNumber(body: NumberBody, value: number, unit: string): Marked {
  const converted = convert(value, unit, body.unit);
  if (within(converted, body.value, body.tolerance)) return { right: true, diagnosis: null };
  return { right: false, diagnosis: listedSlip(body, converted) ?? likelySlip(body, value, unit) };
}

/** The hint of the listed slip that the value comes nearest to. */
function listedSlip(body: NumberBody, converted: number): string | null {
  const near = body.slips.filter((slip) => within(converted, slip.value, body.tolerance));
  const [nearest] = near.toSorted((a, b) => Math.abs(converted - a.value) - Math.abs(converted - b.value));
  return nearest?.hint ?? null;
}

/**
 * What anybody's hand slips at: the unit, the decimal point, the sign. Of several that would make the answer right, the one that comes
 * nearest: 10 for 100 N·m is a decimal point, though 10 kgf·m are near 100 N·m too.
 */
function likelySlip(body: NumberBody, value: number, unit: string): string | null {
  const converted = convert(value, unit, body.unit);
  const used = findUnit(unit);
  const others = UNITS.filter((other) => other.quantity === used?.quantity && other.symbol !== used.symbol);
  const causes = [
    ...others.map(({ symbol }) => ({ meant: convert(value, symbol, body.unit), says: `That would be right in ${symbol}: the size is good, the unit is not.` })),
    ...[converted * 10, converted / 10].map((meant) => ({ meant, says: "Out by a factor of ten. Look at the decimal point." })),
    { meant: -converted, says: "The sign is the wrong way round." },
  ];
  // A figure that was turned into another unit is rounded: a hundredth is allowed at least. A tolerance that is wide beside the value
  // (0 ± 0.01) would make a slip of every miss: a tenth at most.
  const size = Math.abs(body.value);
  const room = Math.max(size * 0.01, Math.min(body.tolerance, size * 0.1));
  const [likeliest] = causes.filter(({ meant }) => within(meant, body.value, room)).toSorted((a, b) => Math.abs(a.meant - body.value) - Math.abs(b.meant - body.value));
  return likeliest?.says ?? null;
}

function markOrder(body: PutInOrderBody, itemIds: string[]): Marked {
  const right = body.items.map((item) => item.id);
  const complete = itemIds.length === right.length && new Set(itemIds).size === right.length && itemIds.every((id) => right.includes(id));
  if (!complete) return { right: false, diagnosis: "Every item stands in the order once." };
  const textOf = (id: string) => body.items.find((item) => item.id === id)?.text ?? "";
  // What can hurt somebody is said first, whatever else is wrong.
  const dangerous = body.neverBefore.find(([first, second]) => itemIds.indexOf(first) < itemIds.indexOf(second));
  if (dangerous) return { right: false, diagnosis: `“${textOf(dangerous[0])}” before “${textOf(dangerous[1])}” can hurt somebody.` };
  const firstWrong = itemIds.findIndex((id, position) => id !== right[position]);
  if (firstWrong === -1) return { right: true, diagnosis: null };
  return { right: false, diagnosis: `“${textOf(itemIds[firstWrong] ?? "")}” comes at another place. What stands before it is in order.` };
}
