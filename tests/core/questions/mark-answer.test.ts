import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { AppError } from "@/lib/core/errors";
import { markAnswer } from "@/lib/core/questions/mark-answer";
import type { GivenAnswer, NumberBody, Question, QuestionBody } from "@/lib/core/questions/types";

const question = (body: QuestionBody): Question => ({ id: "q", stepId: "s", atMs: 0, prompt: "?", explanation: "", lookAgainMs: 0, safetyCritical: false, body });
const number = (value: number, tolerance: number, unit: string, slips: NumberBody["slips"] = []) => question({ kind: "number", value, tolerance, unit, slips });
const give = (value: number, unit: string): GivenAnswer => ({ kind: "number", value, unit });

describe("one of", () => {
  const body: QuestionBody = {
    kind: "one_of",
    choices: [
      { id: "a", text: "The limit", right: true, why: "Below the limit it goes." },
      { id: "b", text: "The new size", right: false, why: "Every used disc is below it." },
      { id: "c", text: "Its age", right: false, why: "" },
    ],
  };
  test.each([
    ["a", true, "Below the limit it goes."],
    ["b", false, "Every used disc is below it."],
    ["c", false, null],
    ["x", false, null],
  ])("choice %s", (choiceId, right, diagnosis) => expect(markAnswer(question(body), { kind: "one_of", choiceId })).toEqual({ right, diagnosis }));

  test("an answer to another kind of question is wrong", () => {
    expect(markAnswer(question(body), give(1, "mm"))).toEqual({ right: false, diagnosis: "That is an answer to another kind of question." });
  });
});

const unitSlip = (symbol: string) => `That would be right in ${symbol}: the size is good, the unit is not.`;
const TEN = "Out by a factor of ten. Look at the decimal point.";
const SIGN = "The sign is the wrong way round.";

// 110 N·m = 81.131836 lbf·ft and 2.2 bar = 31.90830 psi = 220 kPa: vectors/vehicle/units.json. Kinds of slip: common practice, no source.
describe("number with unit", () => {
  test.each<[Question, GivenAnswer, boolean, string | null]>([
    [number(110, 4.4, "N·m"), give(110, "N·m"), true, null],
    [number(110, 4.4, "N·m"), give(114.4, "N·m"), true, null],
    [number(110, 4.4, "N·m"), give(114.41, "N·m"), false, null],
    [number(110, 4.4, "N·m"), give(105.6, "N·m"), true, null],
    [number(110, 4.4, "N·m"), give(81.1, "lbf·ft"), true, null],
    [number(110, 4.4, "N·m"), give(81.1, "N·m"), false, unitSlip("lbf·ft")],
    [number(110, 4.4, "N·m"), give(110, "lbf·ft"), false, unitSlip("N·m")],
    [number(110, 4.4, "N·m"), give(11, "N·m"), false, TEN],
    [number(110, 4.4, "N·m"), give(1100, "N·m"), false, TEN],
    [number(110, 4.4, "N·m"), give(-110, "N·m"), false, SIGN],
    [number(110, 4.4, "N·m"), give(60, "N·m"), false, null],
    [number(100, 4, "N·m"), give(10, "N·m"), false, TEN],
    [number(2.2, 0.05, "bar"), give(220, "kPa"), true, null],
    [number(2.2, 0.05, "bar"), give(31.9, "psi"), true, null],
    [number(2.2, 0.05, "bar"), give(32, "bar"), false, unitSlip("psi")],
    [number(2.2, 0.05, "bar"), give(2.2, "psi"), false, unitSlip("bar")],
    [number(0.05, 0.005, "mm"), give(0.055, "mm"), true, null],
    [number(0.05, 0.005, "mm"), give(0.0551, "mm"), false, null],
    [number(0.05, 0.005, "mm"), give(0.5, "mm"), false, TEN],
    [number(90, 2, "°C"), give(194, "°F"), true, null],
    [number(0.3, 0, "mm"), give(0.1 + 0.2, "mm"), true, null],
    [number(0, 0.01, "mm"), give(0.02, "mm"), false, null],
  ])("case %#", (asked, given, right, diagnosis) => expect(markAnswer(asked, given)).toEqual({ right, diagnosis }));

  test("a listed slip is named before a guessed one, and the nearest of several", () => {
    const asked = number(22, 0.3, "mm", [
      { value: 24, hint: "That is the new size." },
      { value: 24.4, hint: "That is the other axle." },
      { value: 2.2, hint: "That is the pad." },
    ]);
    expect(markAnswer(asked, give(24.1, "mm")).diagnosis).toBe("That is the new size.");
    expect(markAnswer(asked, give(24.3, "mm")).diagnosis).toBe("That is the other axle.");
    expect(markAnswer(asked, give(2.2, "mm")).diagnosis).toBe("That is the pad.");
  });

  test("another quantity is refused", () => expect(() => markAnswer(number(110, 4, "N·m"), give(110, "mm"))).toThrow(AppError));
  test("what is no number is wrong", () => expect(markAnswer(number(110, 4, "N·m"), give(NaN, "N·m"))).toEqual({ right: false, diagnosis: null }));

  test("right is the same in every unit of the quantity", () => {
    fc.assert(
      fc.property(fc.double({ min: 1, max: 500, noNaN: true }), fc.constantFrom("N·m", "lbf·ft", "lbf·in", "kgf·m"), (newtonMetres, unit) => {
        const factor = { "N·m": 1, "lbf·ft": 1.3558179483314004, "lbf·in": 0.1129848290276167, "kgf·m": 9.80665 }[unit] ?? 1;
        expect(markAnswer(number(newtonMetres, 1e-6, "N·m"), give(newtonMetres / factor, unit)).right).toBe(true);
      }),
    );
  });
});

describe("put in order", () => {
  const names = ["Crack the bolts", "Set the pads", "Raise 100 mm", "Push test", "Working height"];
  const body: QuestionBody = {
    kind: "put_in_order",
    items: names.map((text, index) => ({ id: `i${index}`, text })),
    neverBefore: [["i4", "i3"]],
  };
  const order = (...places: number[]): GivenAnswer => ({ kind: "put_in_order", itemIds: places.map((place) => `i${place}`) });

  test.each<[GivenAnswer, boolean, string | null]>([
    [order(0, 1, 2, 3, 4), true, null],
    [order(0, 2, 1, 3, 4), false, "“Raise 100 mm” comes at another place. What stands before it is in order."],
    [order(1, 0, 2, 3, 4), false, "“Set the pads” comes at another place. What stands before it is in order."],
    [order(0, 1, 2, 4, 3), false, "“Working height” before “Push test” can hurt somebody."],
    // The danger is said even where something else is wrong earlier.
    [order(2, 1, 0, 4, 3), false, "“Working height” before “Push test” can hurt somebody."],
    [order(0, 1, 2, 3), false, "Every item stands in the order once."],
    [order(0, 1, 2, 3, 3), false, "Every item stands in the order once."],
    [order(0, 1, 2, 3, 9), false, "Every item stands in the order once."],
    [order(), false, "Every item stands in the order once."],
  ])("case %#", (given, right, diagnosis) => expect(markAnswer(question(body), given)).toEqual({ right, diagnosis }));

  test("only the full order is right, and a diagnosis names two things at most", () => {
    fc.assert(
      fc.property(fc.shuffledSubarray([0, 1, 2, 3, 4], { minLength: 5 }), (places) => {
        const { right, diagnosis } = markAnswer(question(body), order(...places));
        expect(right).toBe(places.every((place, index) => place === index));
        expect(names.filter((name) => diagnosis?.includes(name)).length).toBeLessThanOrEqual(2);
      }),
    );
  });
});
