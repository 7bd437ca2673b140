import type { GivenAnswer, Marked, NumberBody, OneOfBody, PutInOrderBody, Question } from "@/lib/core/questions/types";
import { convert } from "@/lib/core/units/convert";
import { findUnit, UNITS } from "@/lib/core/units/units";

/**
 * Marks an answer. Ids are the question's own (see `unmapAnswer`). A known slip is named, without giving the answer away.
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
  const fits = (candidate: number) => within(candidate, body.value, body.tolerance);
  const slip = body.slips.find((candidate) => within(converted, candidate.value, body.tolerance));
  if (slip) return { right: false, diagnosis: slip.hint };
  const mistaken = unitMistakenFor(body, value, unit);
  if (mistaken) return { right: false, diagnosis: `That would be right in ${mistaken}: the size is good, the unit is not.` };
  if (fits(converted * 10) || fits(converted / 10)) return { right: false, diagnosis: "Out by a factor of ten. Look at the decimal point." };
  if (fits(-converted)) return { right: false, diagnosis: "The sign is the wrong way round." };
  return { right: false, diagnosis: null };
}

/** Another unit of the same quantity in which the bare number would have been right. */
function unitMistakenFor(body: NumberBody, value: number, unit: string): string | null {
  const used = findUnit(unit);
  const other = UNITS.find(
    (candidate) =>
      candidate.quantity === used?.quantity &&
      candidate.symbol !== used.symbol &&
      within(convert(value, candidate.symbol, body.unit), body.value, Math.max(body.tolerance, Math.abs(body.value) * 0.01)),
  );
  return other?.symbol ?? null;
}

function markOrder(body: PutInOrderBody, itemIds: string[]): Marked {
  const right = body.items.map((item) => item.id);
  const complete = itemIds.length === right.length && new Set(itemIds).size === right.length && itemIds.every((id) => right.includes(id));
  if (!complete) return { right: false, diagnosis: "Every item stands in the order once." };
  const textOf = (id: string) => body.items.find((item) => item.id === id)?.text ?? "";
  const dangerous = body.neverBefore.find(([first, second]) => itemIds.indexOf(first) < itemIds.indexOf(second));
  if (dangerous) return { right: false, diagnosis: `“${textOf(dangerous[0])}” before “${textOf(dangerous[1])}” can hurt somebody.` };
  const firstWrong = itemIds.findIndex((id, position) => id !== right[position]);
  if (firstWrong === -1) return { right: true, diagnosis: null };
  return { right: false, diagnosis: `“${textOf(itemIds[firstWrong] ?? "")}” comes at another place. What stands before it is in order.` };
}
