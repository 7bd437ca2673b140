import { describe, expect, test } from "vitest";
import { putInOrderFromSteps, reversedForRefitting } from "@/lib/core/questions/put-in-order-from-steps";
import { questionProblems } from "@/lib/core/questions/question-problems";
import type { Choice, NumberBody, PutInOrderBody, Question, QuestionBody } from "@/lib/core/questions/types";

const step = { title: "Measure", startMs: 1000, endMs: 5000 };
const numberBody = (change: Partial<NumberBody>): NumberBody => ({ kind: "number", unit: "mm", value: 22, tolerance: 0.1, slips: [], ...change });
const question = (body: QuestionBody, change: Partial<Question> = {}): Question => ({ id: "q", stepId: "s", atMs: 5000, prompt: "Which?", explanation: "", lookAgainMs: 0, safetyCritical: false, body, ...change });
const choices = (...rights: boolean[]): Choice[] => rights.map((right, index) => ({ id: `c${index}`, text: `Choice ${index}`, right, why: "" }));
const items = (...texts: string[]) => texts.map((text, index) => ({ id: `i${index}`, text }));

describe("where and what", () => {
  test.each<[string, Partial<Question>, typeof step | undefined, string[]]>([
    ["at the end of its step", {}, step, []],
    ["at its beginning", { atMs: 1000 }, step, []],
    ["a millisecond early", { atMs: 999 }, step, ["The question lies outside its step “Measure”."]],
    ["a millisecond late", { atMs: 5001 }, step, ["The question lies outside its step “Measure”."]],
    ["at no time", { atMs: NaN }, step, ["The question lies outside its step “Measure”."]],
    ["of no step", {}, undefined, ["The question belongs to no step."]],
    ["without words", { prompt: "  " }, step, ["Write the question."]],
  ])("%s", (_, change, inStep, problems) => expect(questionProblems(question(numberBody({}), change), inStep)).toEqual(problems));
});

test.each<[string, QuestionBody, string[]]>([
  ["one right of two", { kind: "one_of", choices: choices(true, false) }, []],
  ["one choice", { kind: "one_of", choices: choices(true) }, ["Give at least two choices."]],
  ["none right", { kind: "one_of", choices: choices(false, false) }, ["Mark exactly one choice as right."]],
  ["two right", { kind: "one_of", choices: choices(true, true) }, ["Mark exactly one choice as right."]],
  ["an empty choice", { kind: "one_of", choices: [...choices(true), { id: "x", text: " ", right: false, why: "" }] }, ["A choice is empty."]],
  ["twice the same", { kind: "one_of", choices: [...choices(true), { id: "x", text: "choice 0 ", right: false, why: "" }] }, ["Two choices say the same."]],
  ["one id twice", { kind: "one_of", choices: [...choices(true), { id: "c0", text: "Other", right: false, why: "" }] }, ["Two choices have the same id."]],
  ["a number", numberBody({ tolerance: 0, slips: [{ value: 24, hint: "That is the new size." }] }), []],
  ["no value", numberBody({ value: NaN }), ["Give the right value."]],
  ["a tolerance below zero", numberBody({ tolerance: -0.1 }), ["The tolerance can't be below zero."]],
  ["a unit that nobody knows", numberBody({ unit: "furlong" }), ["“furlong” is not a unit that Witnessline knows."]],
  ["a slip that would be right", numberBody({ slips: [{ value: 22.05, hint: "?" }] }), ["The slip 22.05 lies within the tolerance: it would be marked right."]],
  ["a slip without a hint", numberBody({ slips: [{ value: 24, hint: "" }] }), ["A slip has no hint."]],
  ["a slip not written yet", numberBody({ slips: [{ value: NaN, hint: "" }] }), []],
  ["an order", { kind: "put_in_order", items: items("A", "B", "C"), neverBefore: [["i2", "i0"]] }, []],
  ["one thing", { kind: "put_in_order", items: items("A"), neverBefore: [] }, ["Give at least two things to put in order."]],
  ["an empty thing", { kind: "put_in_order", items: items("A", ""), neverBefore: [] }, ["One of the things is empty."]],
  ["two alike", { kind: "put_in_order", items: items("A", "a"), neverBefore: [] }, ["Two of the things say the same."]],
  ["a pair against the order", { kind: "put_in_order", items: items("A", "B"), neverBefore: [["i0", "i1"]] }, ["A pair that is never right stands just so in the right order."]],
  ["a pair of one thing", { kind: "put_in_order", items: items("A", "B"), neverBefore: [["i0", "i0"]] }, ["A pair that is never right stands just so in the right order."]],
  ["a pair with a stranger", { kind: "put_in_order", items: items("A", "B"), neverBefore: [["i1", "i9"]] }, ["A pair that is never right names a thing that is not there."]],
])("%s", (_, body, problems) => expect(questionProblems(question(body), step)).toEqual(problems));

test("steps make an order, and its reverse for refitting; both can be asked", () => {
  const steps = [
    { id: "s2", title: "Calliper off ", startMs: 2000 },
    { id: "s1", title: "Wheel off", startMs: 0 },
    { id: "s3", title: " ", startMs: 3000 },
    { id: "s4", title: "Disc off", startMs: 4000 },
  ];
  const order = putInOrderFromSteps(steps);
  expect(order.items).toEqual([
    { id: "s1", text: "Wheel off" },
    { id: "s2", text: "Calliper off" },
    { id: "s4", text: "Disc off" },
  ]);
  const withPair: PutInOrderBody = { ...order, neverBefore: [["s4", "s2"]] };
  expect(reversedForRefitting(withPair).items.map(({ id }) => id)).toEqual(["s4", "s2", "s1"]);
  for (const body of [withPair, reversedForRefitting(withPair)]) expect(questionProblems(question(body), step)).toEqual([]);
});
