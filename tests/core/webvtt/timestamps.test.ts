import { expect, test } from "vitest";
import { formatClock, formatTimestamp, parseTimestamp } from "@/lib/core/webvtt/timestamps";

// Source: W3C WebVTT, "WebVTT timestamp": two or more digits of hours; 213 000 ms is the end of the last slide of its chapters example.
test.each([
  [0, "00:00:00.000"],
  [10_700, "00:00:10.700"],
  [213_000, "00:03:33.000"],
  [3_599_999, "00:59:59.999"],
  [360_000_001, "100:00:00.001"],
])("%i ms is written %s, and read", (ms, text) => {
  expect(formatTimestamp(ms)).toBe(text);
  expect(parseTimestamp(text)).toBe(ms);
});

// Source: same place. Hours may be left out; minutes and seconds are 0–59, a full stop, three digits.
test("hours may be left out", () => expect(parseTimestamp("01:50.100")).toBe(110_100));
test.each(["10.700", "00:60.000", "60:00.000", "00:00.7", "1:00:00.000", "00:00:10,700", " 00:00.000", "00:00.0000", ""])("refuses “%s”", (text) => {
  expect(parseTimestamp(text)).toBeUndefined();
});

test.each([
  [0, "0:00"],
  [247_999, "4:07"],
  [3_729_000, "1:02:09"],
])("%i ms reads %s beside a film", (ms, text) => expect(formatClock(ms)).toBe(text));
