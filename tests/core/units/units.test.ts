import { readFileSync } from "node:fs";
import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { AppError } from "@/lib/core/errors";
import { convert, sameQuantity } from "@/lib/core/units/convert";
import { formatValue } from "@/lib/core/units/format-value";
import { findUnit, UNITS } from "@/lib/core/units/units";

const vectors = JSON.parse(readFileSync("tests/core/vectors/vehicle/units.json", "utf8"));

// Source: the definitions themselves. International yard and pound agreement (1959): 1 ft = 0.3048 m, 1 lb = 0.45359237 kg; standard
// gravity 9.80665 m/s² (3rd CGPM, 1901). Worked in exact fractions (vectors/vehicle/units.json, checked there with scipy.constants).
test.each([
  ["lbf·ft", "N·m", 1.3558179483314004],
  ["lbf·in", "N·m", 0.1129848290276167],
  ["kgf·m", "N·m", 9.80665],
  ["psi", "Pa", 8896443230521 / 1290320000],
  ["bar", "kPa", 100],
  ["bar", "MPa", 0.1],
  ["in", "mm", 25.4],
  ["L", "ml", 1000],
  ["V", "mV", 1000],
  ["A", "mA", 1000],
  ["kN", "N", 1000],
])("1 %s is %s %d", (from, to, factor) => expect(convert(1, from, to) / factor).toBeCloseTo(1, 14));

// Source: vectors/vehicle/units.json, each figure rounded as published there.
describe("published figures", () => {
  const near = (value: number, published: number, digits: number) => expect(value).toBeCloseTo(published, digits);
  test.each(vectors.torqueFromNm as { Nm: number; lbf_ft: number; lbf_in: number; kgf_m: number }[])("$Nm N·m", (row) => {
    near(convert(row.Nm, "N·m", "lbf·ft"), row.lbf_ft, 5);
    near(convert(row.Nm, "N·m", "lbf·in"), row.lbf_in, 4);
    near(convert(row.Nm, "N·m", "kgf·m"), row.kgf_m, 5);
  });
  test.each(vectors.torqueFromLbfFt as { lbf_ft: number; Nm: number }[])("$lbf_ft lbf·ft", (row) => near(convert(row.lbf_ft, "lbf·ft", "N·m"), row.Nm, 5));
  test.each(vectors.pressureFromBar as { bar: number; kPa: number; MPa: number; psi: number }[])("$bar bar", (row) => {
    near(convert(row.bar, "bar", "kPa"), row.kPa, 9);
    near(convert(row.bar, "bar", "MPa"), row.MPa, 9);
    near(convert(row.bar, "bar", "psi"), row.psi, 4);
  });
  test.each(vectors.pressureFromPsi as { psi: number; kPa: number; bar: number }[])("$psi psi", (row) => {
    near(convert(row.psi, "psi", "bar"), row.bar, 7);
    near(convert(row.psi, "psi", "kPa"), row.kPa, 5);
  });
  test.each(vectors.temperature as { C: number; F: number }[])("$C °C is $F °F", (row) => {
    near(convert(row.C, "°C", "°F"), row.F, 9);
    near(convert(row.F, "°F", "°C"), row.C, 9);
  });
});

// How people type units; common practice, no source.
test.each([
  ["Nm", "N·m"], ["N m", "N·m"], ["N.m", "N·m"], ["N-m", "N·m"], ["nm", "N·m"], ["newton metres", "N·m"],
  ["lb ft", "lbf·ft"], ["lb.ft", "lbf·ft"], ["ft-lb", "lbf·ft"], ["ft-lbs", "lbf·ft"], ["ft.lbf", "lbf·ft"], ["lbf ft", "lbf·ft"], ["pound-feet", "lbf·ft"],
  ["in-lb", "lbf·in"], ["kgm", "kgf·m"], ["PSI", "psi"], ["lb/in²", "psi"], ["Bar", "bar"], ["kpa", "kPa"], ["MPa", "MPa"],
  ["mA", "mA"], ["amps", "A"], ["deg C", "°C"], ["ºC", "°C"], ["deg", "°"], ["l", "L"], ["litres", "L"], ["\"", "in"], ["hz", "Hz"], ["KN", "kN"],
])("“%s” is %s", (typed, symbol) => expect(findUnit(typed)?.symbol).toBe(symbol));

test.each(["", " ", "furlong", "constructor", "N·m·m"])("“%s” is no unit", (typed) => expect(findUnit(typed)).toBeUndefined());

test("no name belongs to two units", () => {
  for (const unit of UNITS) for (const name of [unit.symbol, ...unit.aliases]) expect([name, findUnit(name)?.symbol]).toEqual([name, unit.symbol]);
});

test("units of one quantity go together, others are refused", () => {
  expect(sameQuantity("Nm", "ft-lb")).toBe(true);
  expect(sameQuantity("Nm", "N")).toBe(false);
  expect(sameQuantity("furlong", "furlong")).toBe(false);
  expect(() => convert(1, "N·m", "kN")).toThrow(AppError);
  expect(() => convert(1, "N·m", "furlong")).toThrow(/furlong/);
});

test("there and back is the same value", () => {
  const pairs = UNITS.flatMap((a) => UNITS.filter((b) => b.quantity === a.quantity).map((b) => [a.symbol, b.symbol] as const));
  fc.assert(
    fc.property(fc.constantFrom(...pairs), fc.double({ min: -1e6, max: 1e6, noNaN: true }), ([a, b], value) => {
      const back = convert(convert(value, a, b), b, a);
      expect(Math.abs(back - value)).toBeLessThanOrEqual(1e-9 * Math.max(1, Math.abs(value)));
    }),
  );
});

// Source of the space: SI Brochure, 5.4.3: a space between number and unit, but none before the sign of a plane angle. Narrow and unbreakable is ours.
test.each<[number, string, number | undefined, string]>([
  [25, "N·m", undefined, "25\u202fN·m"],
  [0.05, "mm", 0.01, "0.05\u202fmm"],
  [0.05, "mm", 0.001, "0.050\u202fmm"],
  [2.999, "mm", 0.01, "3.00\u202fmm"],
  [1.005, "mm", 0.01, "1.01\u202fmm"],
  [81.131836, "lbf·ft", 0.1, "81.1\u202flbf·ft"],
  [119.6, "N·m", 1, "120\u202fN·m"],
  [-0.0004, "mm", 0.01, "0.00\u202fmm"],
  [-12.3, "°C", 0.5, "-12.3\u202f°C"],
  [90, "°", 1, "90°"],
  [10, "%", 0.1, "10\u202f%"],
])("%d %s at a resolution of %d is shown as “%s”", (value, unit, resolution, text) => expect(formatValue(value, unit, resolution)).toBe(text));
