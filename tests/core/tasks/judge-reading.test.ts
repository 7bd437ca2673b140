import fc from "fast-check";
import { expect, test } from "vitest";
import { AppError } from "@/lib/core/errors";
import { judgeReading } from "@/lib/core/tasks/judge-reading";
import type { ReadingSpec, TakenReading } from "@/lib/core/tasks/types";

/** 105 N·m ±4 %, as worked by hand: 100.8 to 109.2. The demo's value, invented. */
const SET: ReadingSpec = { mode: "set", quantity: "tightening value", unit: "N·m", lower: 100.8, upper: 109.2, resolution: 0.1, instrumentKind: "torque wrench" };
const FOUND: ReadingSpec = { mode: "found", quantity: "disc thickness", unit: "mm", lower: 22, upper: null, resolution: 0.01, instrumentKind: "micrometer" };

const taken = (value: number, unit: string, instrumentInDate: boolean | null = true): TakenReading => ({ value, unit, instrumentId: "i", instrumentInDate });

// Source: simple acceptance, the limits as they are and part of what is accepted (JCGM 106:2012, 8.2, from memory).
test.each([
  [105, "inside", true],
  [100.8, "inside", true],
  [109.2, "inside", true],
  [100.79, "outside", false],
  [109.3, "outside", false],
  [0, "outside", false],
])("a set %d N·m is %s: the limits decide", (value, verdict, canBeMet) => {
  expect(judgeReading(SET, taken(value, "N·m"))).toMatchObject({ verdict, canBeMet });
});

// Source: lbf·ft is 0.3048 × 0.45359237 × 9.80665 N·m by definition: 80 → 108.465…, 81 → 109.821… N·m.
test.each([
  [80, "lbf·ft", true],
  [81, "lbf·ft", false],
  [80, "ft-lb", true],
])("a set %d %s is turned into the limits' unit first", (value, unit, canBeMet) => {
  expect(judgeReading(SET, taken(value, unit)).canBeMet).toBe(canBeMet);
});

test("says how far a set reading lies outside, on which side", () => {
  expect(judgeReading(SET, taken(112, "N·m")).sentence).toMatch(/^2\.8\u202fN·m over: outside the limits/);
  expect(judgeReading(SET, taken(98.3, "N·m")).sentence).toMatch(/^2\.5\u202fN·m under: outside the limits/);
});

// A found value is the vehicle's, not the apprentice's: outside can be met. Near is within two resolutions: common practice, no source.
test.each([
  [22.5, "inside"],
  [22.03, "inside"],
  [22.02, "near"],
  [22, "near"],
  [21.99, "outside"],
])("a found %d mm is %s, and the assessor decides", (value, verdict) => {
  const judged = judgeReading(FOUND, taken(value, "mm"));
  expect(judged).toMatchObject({ verdict, canBeMet: true });
  if (verdict !== "inside") expect(judged.sentence).toMatch(/Measured right, and said so\?$/);
});

test("binary fractions don't push a value over its limit: 0.1 + 0.2 is 0.3", () => {
  const spec = { ...SET, unit: "mm", lower: null, upper: 0.3 };
  expect(judgeReading(spec, taken(0.1 + 0.2, "mm")).canBeMet).toBe(true);
});

test.each([SET, FOUND])("an instrument past its calibration date makes nothing met: $mode", (spec) => {
  const judged = judgeReading(spec, taken(spec.lower ?? 0, spec.unit, false));
  expect(judged.canBeMet).toBe(false);
  expect(judged.sentence).toMatch(/past its calibration date/);
});

test.each([
  ["another quantity", taken(105, "mm")],
  ["an unknown unit", taken(105, "furlong")],
  ["no number", taken(Number.NaN, "N·m")],
  ["infinity", taken(Number.POSITIVE_INFINITY, "N·m")],
])("refuses %s", (_name, reading) => {
  expect(() => judgeReading(SET, reading)).toThrow(AppError);
});

test("for any limits and any value, a set reading can be met exactly between them", () => {
  const tenths = fc.integer({ min: -10_000, max: 10_000 });
  fc.assert(
    fc.property(tenths, fc.nat(1000), tenths, (low, width, value) => {
      const spec = { ...SET, lower: low / 10, upper: (low + width) / 10 };
      expect(judgeReading(spec, taken(value / 10, "N·m")).canBeMet).toBe(value >= low && value <= low + width);
    }),
  );
});
