import { readFileSync } from "node:fs";
import { expect, test } from "vitest";
import { daysBetween } from "@/lib/core/dates";
import { expectedHours, programmeHours, type HoursRule } from "@/lib/core/hours/expected-hours";
import { reviewDue } from "@/lib/core/hours/review-due";

type Case = { name: string; weeks?: number; leaveWeeks?: number; hoursPerWeek: number; expectedHours?: number };
const { cases } = JSON.parse(readFileSync("tests/core/vectors/records/off-the-job-hours.json", "utf8")) as { cases: Case[] };
const whole = cases.filter((each) => each.expectedHours !== undefined);

test("the three worked examples of whole programmes are there", () => {
  expect(whole).toHaveLength(3);
});

// Source: tests/core/vectors/records/SOURCE.md.
test.each(whole)("$name: $expectedHours h", ({ weeks = 0, leaveWeeks = 0, hoursPerWeek, expectedHours: expected = 0 }) => {
  expect(programmeHours({ weeks, leaveWeeks, hoursPerWeek, cappedAtHours: 30, share: 0.2 })).toBeCloseTo(expected, 9);
});

// The demo scenario's first situation, worked by hand: 32.0 weeks × 139.2/156 × 6 h = 171.3 h; 148.0 logged leaves 23.3 h.
const THREE_YEARS: HoursRule = { weeks: 156, leaveWeeks: 16.8, hoursPerWeek: 30, cappedAtHours: 30, share: 0.2 };

test("from 2 Feb to 14 Sep 2026, 171.3 hours should be logged", () => {
  const weeks = daysBetween("2026-02-02", "2026-09-14") / 7;
  expect(weeks).toBe(32);
  expect(expectedHours(THREE_YEARS, weeks)).toBeCloseTo(171.3, 1);
  expect(expectedHours(THREE_YEARS, weeks) - 148).toBeCloseTo(23.3, 1);
});

test("nothing is expected before the start, and no more than the whole after the end", () => {
  expect(expectedHours(THREE_YEARS, -3)).toBe(0);
  expect(expectedHours(THREE_YEARS, 156)).toBeCloseTo(programmeHours(THREE_YEARS), 9);
  expect(expectedHours(THREE_YEARS, 400)).toBeCloseTo(programmeHours(THREE_YEARS), 9);
});

// The demo scenario's second situation: last review 8 Jun, every 84 days, so due 31 Aug; on 14 Sep it is 14 days late.
test.each([
  ["2026-06-08", "2026-09-14", "2026-08-31", 14],
  ["2026-06-08", "2026-08-31", "2026-08-31", 0],
  ["2026-06-08", "2026-07-01", "2026-08-31", 0],
])("a review after %s, seen on %s, is due on %s and %i days late", (last, today, dueOn, daysLate) => {
  expect(reviewDue(last, 84, today)).toEqual({ dueOn, daysLate });
});
