import fc from "fast-check";
import { expect, test } from "vitest";
import { askQuestion, unmapAnswer, type Chance } from "@/lib/core/questions/ask-question";
import { markAnswer } from "@/lib/core/questions/mark-answer";
import type { Question, QuestionBody } from "@/lib/core/questions/types";

const CANARY = "canary-7c1e";
const canary = (name: string) => `${CANARY}-${name}`;

const bodies: QuestionBody[] = [
  { kind: "one_of", choices: ["a", "b", "c"].map((name, index) => ({ id: canary(name), text: `Choice ${name}`, right: index === 0, why: canary("why") })) },
  { kind: "number", unit: "mm", value: 7_171_717, tolerance: 313_131, slips: [{ value: 5_353_535, hint: canary("hint") }] },
  { kind: "put_in_order", items: ["a", "b", "c", "d"].map((name) => ({ id: canary(name), text: `Item ${name}` })), neverBefore: [[canary("d"), canary("a")]] },
];
const question = (body: QuestionBody): Question => ({
  id: "q",
  stepId: canary("step"),
  atMs: 8_181_818,
  prompt: "Which?",
  explanation: canary("explanation"),
  lookAgainMs: 9_292_929,
  safetyCritical: true,
  body,
});

/** Chance from a list of numbers, over and over. */
function chanceOf(numbers: readonly number[]): Chance {
  let at = 0;
  let ids = 0;
  return { id: () => `r${(ids += 1)}`, number: () => numbers[(at += 1) % numbers.length] ?? 0 };
}
const numbers = fc.array(fc.double({ min: 0, max: 1, maxExcluded: true, noNaN: true }), { minLength: 1, maxLength: 12 });
const anyBody = fc.constantFrom(...bodies);

test("nothing that is right, nor why, nor an id of the question's own goes out", () => {
  fc.assert(
    fc.property(anyBody, numbers, (body, list) => {
      const sent = JSON.stringify(askQuestion(question(body), "attempt", chanceOf(list)).asked);
      expect(sent).not.toContain(CANARY);
      expect(sent).not.toMatch(/7171717|313131|5353535|8181818|9292929|right|why|tolerance|value/);
      expect(sent).toContain("Which?");
    }),
  );
});

test("the same chance asks the same", () => {
  fc.assert(
    fc.property(anyBody, numbers, (body, list) => {
      const ask = () => askQuestion(question(body), "t", chanceOf(list));
      expect(ask()).toEqual(ask());
    }),
  );
});

test("everything is asked once, and finds its way back", () => {
  fc.assert(
    fc.property(anyBody, numbers, (body, list) => {
      const { asked, idMap } = askQuestion(question(body), "t", chanceOf(list));
      const own = body.kind === "one_of" ? body.choices : body.kind === "number" ? [] : body.items;
      const sent = asked.ask.kind === "one_of" ? asked.ask.choices : asked.ask.kind === "number" ? [] : asked.ask.items;
      expect(Object.keys(idMap)).toHaveLength(own.length);
      expect(sent.map(({ id, text }) => `${idMap[id]} ${text}`).toSorted()).toEqual(own.map(({ id, text }) => `${id} ${text}`).toSorted());
    }),
  );
});

test("an order never comes already solved", () => {
  fc.assert(
    fc.property(numbers, (list) => {
      const { asked, idMap } = askQuestion(question(bodies[2] as QuestionBody), "t", chanceOf(list));
      if (asked.ask.kind !== "put_in_order") throw new Error("another kind");
      const given = unmapAnswer({ kind: "put_in_order", itemIds: asked.ask.items.map(({ id }) => id) }, idMap);
      expect(given && markAnswer(question(bodies[2] as QuestionBody), given).right).toBe(false);
    }),
  );
});

test("every place is equally likely for every choice", () => {
  // A shuffle over every possible course of two draws of three and two: each of the six orders once.
  const orders = [0, 1, 2].flatMap((first) =>
    [0, 1].map((second) => {
      let ids = 0;
      const draws = [first / 3 + 0.01, second / 2 + 0.01];
      const chance: Chance = { id: () => `r${(ids += 1)}`, number: () => draws.shift() ?? 0 };
      const { asked } = askQuestion(question(bodies[0] as QuestionBody), "t", chance);
      return asked.ask.kind === "one_of" ? asked.ask.choices.map(({ text }) => text).join() : "";
    }),
  );
  expect(new Set(orders).size).toBe(6);
});

test("ids of another asking, or of an object, are nobody's", () => {
  const idMap = { r1: "a" };
  expect(unmapAnswer({ kind: "one_of", choiceId: "r1" }, idMap)).toEqual({ kind: "one_of", choiceId: "a" });
  expect(unmapAnswer({ kind: "one_of", choiceId: "a" }, idMap)).toBeUndefined();
  expect(unmapAnswer({ kind: "one_of", choiceId: "constructor" }, idMap)).toBeUndefined();
  expect(unmapAnswer({ kind: "put_in_order", itemIds: ["r1", "r2"] }, idMap)).toBeUndefined();
  expect(unmapAnswer({ kind: "number", value: 1, unit: "mm" }, idMap)).toEqual({ kind: "number", value: 1, unit: "mm" });
});
