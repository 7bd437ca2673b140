import type { Question } from "@/lib/core/questions/types";
import { findUnit } from "@/lib/core/units/units";

/** What is wrong with a question as it was written, as sentences; empty when nothing is. @param step the step it belongs to, if it is known */
export function questionProblems(question: Question, step: { startMs: number; endMs: number; title: string } | undefined): string[] {
  const problems: string[] = [];
  if (question.prompt.trim() === "") problems.push("Write the question.");
  if (!step) problems.push("The question belongs to no step.");
  else if (question.atMs < step.startMs || question.atMs > step.endMs) problems.push(`The question lies outside its step “${step.title}”.`);
  return [...problems, ...bodyProblems(question)];
}

function bodyProblems({ body }: Question): string[] {
  if (body.kind === "one_of") {
    const right = body.choices.filter((choice) => choice.right).length;
    return [
      ...(body.choices.length < 2 ? ["Give at least two choices."] : []),
      ...(right === 1 ? [] : ["Mark exactly one choice as right."]),
      ...(body.choices.some((choice) => choice.text.trim() === "") ? ["A choice is empty."] : []),
      ...repeated(body.choices.map((choice) => choice.text), "Two choices say the same."),
    ];
  }
  if (body.kind === "number") {
    return [
      ...(Number.isFinite(body.value) ? [] : ["Give the right value."]),
      ...(body.tolerance >= 0 ? [] : ["The tolerance can't be below zero."]),
      ...(findUnit(body.unit) ? [] : [`“${body.unit}” is not a unit that Witnessline knows.`]),
    ];
  }
  const ids = body.items.map((item) => item.id);
  const contradiction = body.neverBefore.some(([first, second]) => ids.indexOf(first) <= ids.indexOf(second));
  return [
    ...(body.items.length < 2 ? ["Give at least two things to put in order."] : []),
    ...(body.items.some((item) => item.text.trim() === "") ? ["One of the things is empty."] : []),
    ...repeated(body.items.map((item) => item.text), "Two of the things say the same."),
    ...(contradiction ? ["A pair that is never right stands just so in the right order."] : []),
  ];
}

const repeated = (texts: string[], message: string): string[] =>
  new Set(texts.map((text) => text.trim().toLowerCase())).size === texts.length ? [] : [message];
