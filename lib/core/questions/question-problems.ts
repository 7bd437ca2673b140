import type { NumberBody, OneOfBody, PutInOrderBody, Question } from "@/lib/core/questions/types";
import { findUnit } from "@/lib/core/units/units";

/** What is wrong with a question as it was written, as sentences; empty when nothing is. @param step the step it belongs to, if it is known */
export function questionProblems(question: Question, step: { startMs: number; endMs: number; title: string } | undefined): string[] {
  const problems: string[] = [];
  if (question.prompt.trim() === "") problems.push("Write the question.");
  if (!step) problems.push("The question belongs to no step.");
  else if (!(question.atMs >= step.startMs && question.atMs <= step.endMs)) problems.push(`The question lies outside its step “${step.title}”.`);
  return [...problems, ...bodyProblems(question)];
}

function bodyProblems({ body }: Question): string[] {
  if (body.kind === "one_of") return oneOfProblems(body);
  return body.kind === "number" ? numberProblems(body) : orderProblems(body);
}

const when = (wrong: boolean, sentence: string): string[] => (wrong ? [sentence] : []);

const isRepeated = (texts: string[]): boolean => new Set(texts.map((text) => text.trim().toLowerCase())).size < texts.length;

const isEmpty = ({ text }: { text: string }): boolean => text.trim() === "";

function oneOfProblems({ choices }: OneOfBody): string[] {
  return [
    ...when(choices.length < 2, "Give at least two choices."),
    ...when(choices.filter((choice) => choice.right).length !== 1, "Mark exactly one choice as right."),
    ...when(choices.some(isEmpty), "A choice is empty."),
    ...when(isRepeated(choices.map(({ text }) => text)), "Two choices say the same."),
    ...when(new Set(choices.map(({ id }) => id)).size < choices.length, "Two choices have the same id."),
  ];
}

function numberProblems({ value, tolerance, unit, slips }: NumberBody): string[] {
  return [
    ...when(!Number.isFinite(value), "Give the right value."),
    ...when(!(tolerance >= 0 && Number.isFinite(tolerance)), "The tolerance can't be below zero."),
    ...when(!findUnit(unit), `“${unit}” is not a unit that Witnessline knows.`),
    // A slip without a number is a line that was added and is not written yet.
    ...slips.filter((slip) => Number.isFinite(slip.value)).flatMap((slip) => [
      ...when(slip.hint.trim() === "", "A slip has no hint."),
      ...when(Math.abs(slip.value - value) <= tolerance, `The slip ${slip.value} lies within the tolerance: it would be marked right.`),
    ]),
  ];
}

function orderProblems({ items, neverBefore }: PutInOrderBody): string[] {
  const place = new Map(items.map(({ id }, index) => [id, index]));
  const pairs = neverBefore.map(([first, second]) => [place.get(first), place.get(second)] as const);
  return [
    ...when(items.length < 2, "Give at least two things to put in order."),
    ...when(items.some(isEmpty), "One of the things is empty."),
    ...when(isRepeated(items.map(({ text }) => text)), "Two of the things say the same."),
    ...when(place.size < items.length, "Two of the things have the same id."),
    ...when(pairs.some((pair) => pair.includes(undefined)), "A pair that is never right names a thing that is not there."),
    ...when(
      pairs.some(([first, second]) => first !== undefined && second !== undefined && first <= second),
      "A pair that is never right stands just so in the right order.",
    ),
  ];
}
