import fc from "fast-check";
import { expect, test } from "vitest";
import { formatTightening, parseTightening } from "@/lib/core/steps/parse-tightening";

const LBF_FT = 1.3558179483314004;

// Source of the factors: the exact definitions (see units.test.ts). How people type values: common practice, no source.
test.each<[string, number, number | null]>([
  ["25 Nm", 25, null],
  ["25Nm", 25, null],
  [" 25 N·m ", 25, null],
  ["27,5 Nm", 27.5, null],
  ["18 lbf ft", 18 * LBF_FT, null],
  ["18 ft-lb", 18 * LBF_FT, null],
  ["88.5 lbf in", 88.5 * 0.1129848290276167, null],
  ["5 kgf m", 49.03325, null],
  ["25 N·m + 90°", 25, 90],
  ["50 Nm +60°+60", 50, 120],
  ["50 Nm + 60 deg + 60 degrees", 50, 120],
  ["40 Nm+90º", 40, 90],
  ["0.125 Nm", 0.125, null],
])("“%s” is %d N·m and %s°", (typed, newtonMetres, angleDegrees) => {
  const parsed = parseTightening(typed);
  expect(parsed).toEqual({ newtonMetres: expect.closeTo(newtonMetres, 9), angleDegrees });
});

// Each of these could be taken for another value by somebody: nothing is guessed.
test.each([
  ["", /not understood/],
  ["tight", /not understood/],
  ["25", /Say the unit/],
  ["25 + 90°", /Say the unit/],
  ["25 bar", /“bar” is not a unit of torque/],
  ["90°", /not a unit of torque/],
  ["25-30 Nm", /not understood/],
  ["25 Nm 90°", /not understood/],
  ["25 Nm + 40 Nm", /not understood/],
  ["25 Nm ± 10 %", /not understood/],
  ["-25 Nm", /not understood/],
  ["0 Nm", /above zero/],
  ["25 Nm + 0°", /above zero/],
  ["25 Nm + 900°", /full turn/],
  ["1,100 Nm", /thousands or as a fraction/],
  ["1.100 Nm", /thousands or as a fraction/],
])("“%s” is refused with a sentence", (typed, sentence) => expect(parseTightening(typed)).toEqual({ problem: expect.stringMatching(sentence) }));

test.each<[string, string]>([
  ["25 Nm", "25\u202fN·m"],
  ["27,5 Nm", "27.5\u202fN·m"],
  ["8.25 Nm", "8.25\u202fN·m"],
  ["112.5 Nm", "112.5\u202fN·m"],
  ["1250 Nm", "1250\u202fN·m"],
  ["18 lbf ft", "24.4\u202fN·m"],
  ["100 lbf ft", "136\u202fN·m"],
  ["50 Nm +60°+60", "50\u202fN·m + 60° + 60°"],
  ["25 N·m + 90°", "25\u202fN·m + 90°"],
])("“%s” is shown as “%s”", (entered, shown) => {
  const parsed = parseTightening(entered);
  if ("problem" in parsed) throw new Error(parsed.problem);
  expect(formatTightening({ ...parsed, entered })).toBe(shown);
});

test("without what was entered, stages are shown as their sum", () => {
  expect(formatTightening({ newtonMetres: 50, angleDegrees: 120 })).toBe("50\u202fN·m + 120°");
  expect(formatTightening({ newtonMetres: 50, angleDegrees: 120, entered: "50 Nm + 90°" })).toBe("50\u202fN·m + 120°");
});

test("what is shown of a value in N·m is understood as the same value", () => {
  const value = fc.record({ tenths: fc.integer({ min: 1, max: 9999 }), stages: fc.array(fc.integer({ min: 1, max: 360 }), { maxLength: 3 }) });
  fc.assert(
    fc.property(value, ({ tenths, stages }) => {
      const entered = [`${tenths / 10} Nm`, ...stages.map((degrees) => `${degrees}°`)].join(" + ");
      const parsed = parseTightening(entered);
      if ("problem" in parsed) throw new Error(parsed.problem);
      expect(parseTightening(formatTightening({ ...parsed, entered }))).toEqual(parsed);
    }),
  );
});
