import fc from "fast-check";
import { expect, test } from "vitest";
import { addDays, addMonths, ageOn, daysBetween, formatDay } from "@/lib/core/dates";

// Weekdays by the calendar: 1 Dec 2026 was a Tuesday, 1 Jan 2000 was a Saturday, 29 Feb 2024 a Thursday.
test.each([
  ["2026-12-01", "Tue 1 Dec 2026"],
  ["2000-01-01", "Sat 1 Jan 2000"],
  ["2024-02-29", "Thu 29 Feb 2024"],
])("%s is read %s", (day, text) => {
  expect(formatDay(day)).toBe(text);
});

test.each([
  ["2026-12-01", 12, "2027-12-01"],
  ["2026-01-31", 1, "2026-02-28"],
  ["2024-01-31", 1, "2024-02-29"],
  ["2024-02-29", 12, "2025-02-28"],
  ["2026-08-31", 6, "2027-02-28"],
  ["2026-11-30", 3, "2027-02-28"],
  ["2026-12-31", 1, "2027-01-31"],
  ["2026-03-31", -1, "2026-02-28"],
  ["2026-05-05", 0, "2026-05-05"],
])("%s and %i months: %s, at most the month's last day", (day, months, expected) => {
  expect(addMonths(day, months)).toBe(expected);
});

test.each([
  ["2009-03-15", "2026-09-14", 17],
  ["2008-09-14", "2026-09-14", 18],
  ["2008-09-15", "2026-09-14", 17],
  ["2008-02-29", "2026-02-28", 17],
  ["2008-02-29", "2026-03-01", 18],
  ["2008-02-29", "2028-02-29", 20],
])("born %s, on %s: %i whole years", (born, day, age) => {
  expect(ageOn(born, day)).toBe(age);
});

test.each([
  ["2026-06-08", 84, "2026-08-31"],
  ["2024-02-28", 1, "2024-02-29"],
  ["2026-12-31", 1, "2027-01-01"],
  ["2026-03-01", -1, "2026-02-28"],
])("%s and %i days: %s", (day, days, expected) => {
  expect(addDays(day, days)).toBe(expected);
  expect(daysBetween(day, expected)).toBe(days);
});

const day = fc.date({ min: new Date("1950-01-01"), max: new Date("2100-12-31"), noInvalidDate: true }).map((date) => date.toISOString().slice(0, 10));

test("days added are the days between, whatever lies between; months added end in the right month", () => {
  fc.assert(
    fc.property(day, fc.integer({ min: -2000, max: 2000 }), (from, n) => {
      expect(daysBetween(from, addDays(from, n))).toBe(n);
      const to = addMonths(from, n);
      const monthOf = (iso: string) => Number(iso.slice(0, 4)) * 12 + Number(iso.slice(5, 7));
      expect(monthOf(to) - monthOf(from)).toBe(n);
      expect(Number(to.slice(8))).toBeLessThanOrEqual(Number(from.slice(8)));
      expect(new Date(to).toISOString().slice(0, 10)).toBe(to);
    }),
  );
});
