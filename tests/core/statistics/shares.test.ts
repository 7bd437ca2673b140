import { readFileSync } from "node:fs";
import fc from "fast-check";
import { expect, test } from "vitest";
import { firstTimeRight } from "@/lib/core/statistics/first-time-right";
import { wilsonInterval } from "@/lib/core/statistics/wilson";

type Case = { k: number; n: number; expected: [number, number] | null; published?: [number, number] | null; source: string };
const { cases } = JSON.parse(readFileSync("tests/core/vectors/stats/wilson-interval.json", "utf8")) as { cases: Case[] };

test("all fifteen cases are there", () => {
  expect(cases).toHaveLength(15);
});

// Source: tests/core/vectors/stats/SOURCE.md (Newcombe 1998, Table I, method 3; R; statsmodels).
test.each(cases)("$k of $n: $source", ({ k, n, expected, published }) => {
  const interval = wilsonInterval(k, n);
  if (expected === null) {
    expect(interval).toBeNull();
    return;
  }
  expect(interval?.low).toBeCloseTo(expected[0], 12);
  expect(interval?.high).toBeCloseTo(expected[1], 12);
  // The printed table has four places.
  if (published) {
    expect(Math.abs((interval?.low ?? -1) - published[0])).toBeLessThanOrEqual(5e-5);
    expect(Math.abs((interval?.high ?? -1) - published[1])).toBeLessThanOrEqual(5e-5);
  }
});

test("limits lie in [0, 1] around the share, and turn over when right and wrong do", () => {
  fc.assert(
    fc.property(fc.integer({ min: 1, max: 100_000 }), fc.nat(), (n, pick) => {
      const k = pick % (n + 1);
      const interval = wilsonInterval(k, n);
      const mirror = wilsonInterval(n - k, n);
      if (!interval || !mirror) throw new Error("There is an interval for every n above 0.");
      expect(interval.low).toBeGreaterThanOrEqual(0);
      expect(interval.low).toBeLessThanOrEqual(k / n);
      expect(interval.high).toBeGreaterThanOrEqual(k / n);
      expect(interval.high).toBeLessThanOrEqual(1);
      expect(interval.low).toBeCloseTo(1 - mirror.high, 12);
    }),
  );
});

// Source: trade practice citing Ebel & Frisbie 1991, read second-hand: under 30 answers counts only, under 100 with caution.
test.each([
  [0, 0, "counts_only"],
  [29, 29, "counts_only"],
  [20, 30, "with_caution"],
  [99, 99, "with_caution"],
  [60, 100, "enough"],
] as const)("%i of %i: %s", (right, answers, trust) => {
  const summary = firstTimeRight(right, answers);
  expect(summary).toMatchObject({ right, answers, trust });
  expect(summary.share === null).toBe(trust === "counts_only");
  if (summary.share) expect(summary.share).toEqual({ value: right / answers, ...wilsonInterval(right, answers) });
});
