import { readFileSync } from "node:fs";
import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { ALLOWANCE_MS, LONGEST_GAP_MS, MAX_RATE, acceptSpans, coveredMs, furthestAllowed, seenShare, unionSpans, type Span } from "@/lib/core/coverage/spans";
import { SEEN_SHARE } from "@/lib/core/modules/knowledge";

// Source: vectors/coverage/xapi-progress.json (format and first example of the xAPI video profile; figures worked there).
type Case = { playedSegments: string; length: number; watchedSeconds: number; progressUnrounded: number; note: string };
test.each(JSON.parse(readFileSync("tests/core/vectors/coverage/xapi-progress.json", "utf8")).progressCases as Case[])(
  "played “$playedSegments” of $length s $note",
  ({ playedSegments, length, watchedSeconds, progressUnrounded }) => {
    const toMs = (seconds = "") => Math.round(Number(seconds) * 1000);
    const spans = playedSegments.split("[,]").map((segment): Span => [toMs(segment.split("[.]")[0]), toMs(segment.split("[.]")[1])]);
    expect(coveredMs(spans, 0, length * 1000)).toBe(Math.round(watchedSeconds * 1000));
    expect(seenShare(spans, { startMs: 0, endMs: length * 1000 })).toBeCloseTo(progressUnrounded, 6);
  },
);

const span: fc.Arbitrary<Span> = fc.tuple(fc.nat(300), fc.nat(300));
const spans = fc.array(span, { maxLength: 12 });
/** Every whole millisecond that the spans cover, counted one by one. */
const ground = (list: readonly Span[]) => new Set(list.flatMap(([start, end]) => Array.from({ length: Math.max(0, end - start) }, (_, ms) => start + ms)));

describe("united spans", () => {
  test("cover the same ground, in order, with a gap between any two", () => {
    fc.assert(
      fc.property(spans, (list) => {
        const united = unionSpans(list);
        expect(ground(united)).toEqual(ground(list));
        united.forEach(([start, end], index) => {
          expect(end).toBeGreaterThan(start);
          expect(start).toBeGreaterThan(united[index - 1]?.[1] ?? -1);
        });
        expect(unionSpans(united)).toEqual(united);
        expect(unionSpans(list.toReversed())).toEqual(united);
      }),
    );
  });

  test("covered time is the ground counted, and more play never covers less", () => {
    fc.assert(
      fc.property(spans, spans, span, (list, more, [from, to]) => {
        const inside = [...ground(list)].filter((ms) => ms >= from && ms < to).length;
        expect(coveredMs(list, from, to)).toBe(inside);
        expect(coveredMs([...list, ...more], from, to)).toBeGreaterThanOrEqual(inside);
      }),
    );
  });

  test("what is no number is no span", () => expect(unionSpans([[NaN, 5], [0, NaN], [7, 3], [1, 2]])).toEqual([[1, 2]]));
});

// Product: "A step counts as seen at ≥ 95 % of its length".
test.each([
  [9500, true],
  [9499, false],
  [10_000, true],
  [0, false],
])("a step of 10 s with %i ms played is seen: %s", (playedMs, seen) => {
  expect(seenShare([[2000, 2000 + playedMs]], { startMs: 2000, endMs: 12_000 }) >= SEEN_SHARE).toBe(seen);
});
test("a step without length is never seen", () => expect(seenShare([[0, 10]], { startMs: 5, endMs: 5 })).toBe(0));

// Product: "a span longer than wall time × rate (with a small allowance) is cut". Budgets worked by hand: time × rate + min(3 s, time / 2).
describe("what the server accepts", () => {
  test.each<[string, Parameters<typeof acceptSpans>[0], Span[]]>([
    ["as long as the time that passed", { reported: [[0, 10_000]], durationMs: 60_000, elapsedMs: 10_000, rate: 1 }, [[0, 10_000]]],
    ["longer by the allowance", { reported: [[0, 20_000]], durationMs: 60_000, elapsedMs: 10_000, rate: 1 }, [[0, 13_000]]],
    ["longer by half of a short time", { reported: [[0, 20_000]], durationMs: 60_000, elapsedMs: 1000, rate: 1 }, [[0, 1500]]],
    ["at double rate", { reported: [[0, 60_000]], durationMs: 60_000, elapsedMs: 10_000, rate: 2 }, [[0, 23_000]]],
    ["a claim of four times", { reported: [[0, 60_000]], durationMs: 60_000, elapsedMs: 10_000, rate: 4 }, [[0, 23_000]]],
    ["no time at all", { reported: [[0, 60_000]], durationMs: 60_000, elapsedMs: 0, rate: 2 }, []],
    ["a clock that ran back", { reported: [[0, 60_000]], durationMs: 60_000, elapsedMs: -5000, rate: 2 }, []],
    ["a clock that is no number", { reported: [[0, 60_000]], durationMs: 60_000, elapsedMs: NaN, rate: 1 }, []],
    ["a rate that is no number", { reported: [[0, 60_000]], durationMs: 60_000, elapsedMs: 10_000, rate: NaN }, [[0, 13_000]]],
    ["past the end", { reported: [[50_000, 90_000]], durationMs: 60_000, elapsedMs: 60_000, rate: 1 }, [[50_000, 60_000]]],
    ["before the beginning", { reported: [[-500, 500]], durationMs: 60_000, elapsedMs: 60_000, rate: 1 }, [[0, 500]]],
    ["a film of unknown length", { reported: [[0, 500]], durationMs: 0, elapsedMs: 60_000, rate: 1 }, []],
    ["nonsense", { reported: [[NaN, NaN], [9, 3], [5, Infinity]], durationMs: 10, elapsedMs: 60_000, rate: 1 }, [[5, 10]]],
    ["the same twice counts once", { reported: [[0, 5000], [0, 5000]], durationMs: 60_000, elapsedMs: 5000, rate: 1 }, [[0, 5000]]],
    ["the later of two is cut", { reported: [[30_000, 40_000], [0, 10_000]], durationMs: 60_000, elapsedMs: 10_000, rate: 1 }, [[0, 10_000], [30_000, 33_000]]],
    ["broken milliseconds", { reported: [[0.4, 999.6]], durationMs: 60_000, elapsedMs: 1000, rate: 1 }, [[1, 999]]],
  ])("%s", (_, of, accepted) => expect(acceptSpans(of)).toEqual(accepted));

  const report = fc.record({ reported: fc.array(fc.tuple(fc.nat(100_000), fc.nat(100_000)), { maxLength: 6 }), elapsedMs: fc.nat(20_000), rate: fc.double({ min: 0.1, max: 8, noNaN: true }) });

  test("never more than was reported, nor outside the film, nor more than the time allows", () => {
    fc.assert(
      fc.property(report, ({ reported, elapsedMs, rate }) => {
        const accepted = acceptSpans({ reported, elapsedMs, rate, durationMs: 80_000 });
        const length = coveredMs(accepted, 0, 80_000);
        expect(length).toBe(accepted.reduce((sum, [start, end]) => sum + end - start, 0));
        expect(length).toBeLessThanOrEqual(elapsedMs * Math.min(rate < 0.25 ? 0.25 : rate, MAX_RATE) + ALLOWANCE_MS);
        expect(coveredMs([...reported, ...accepted], 0, 80_000)).toBe(coveredMs(reported, 0, 80_000));
      }),
    );
  });

  test("however often and however it is reported, a minute gives no more than two and a half", () => {
    fc.assert(
      fc.property(fc.array(fc.integer({ min: 0, max: 6000 }), { maxLength: 60 }), (gaps) => {
        const whole: Span[] = [[0, 3_600_000]];
        const gained = gaps.reduce((sum, elapsedMs) => sum + coveredMs(acceptSpans({ reported: whole, durationMs: 3_600_000, elapsedMs, rate: 9 }), 0, 3_600_000), 0);
        expect(gained).toBeLessThanOrEqual(gaps.reduce((sum, gap) => sum + gap, 0) * 2.5);
      }),
    );
  });
});

describe("how far somebody may go", () => {
  test.each<[string, Span[], number, number]>([
    ["nothing played: a moment from the beginning", [], 0, 1500],
    ["to the end of what was played", [[0, 9000]], 0, 10_500],
    ["over a gap too short to see", [[0, 9000], [10_000, 20_000]], 0, 21_500],
    ["not over a real gap", [[0, 9000], [11_000, 20_000]], 0, 10_500],
    ["what lies before the step doesn't matter", [[0, 4000]], 60_000, 61_500],
    ["played in another order", [[5000, 9000], [0, 5000]], 0, 10_500],
  ])("%s", (_, played, fromMs, reach) => expect(furthestAllowed(played, fromMs)).toBe(reach));

  test("more play never takes reach away", () => {
    fc.assert(
      fc.property(spans, spans, fc.nat(300), fc.nat(50), (list, more, from, slack) => {
        expect(furthestAllowed([...list, ...more], from, slack)).toBeGreaterThanOrEqual(furthestAllowed(list, from, slack));
      }),
    );
  });
});

// The product's rule is time passed × rate; that nobody plays for longer than this without a report is ours.
test("whoever was silent for a day has not been playing all day", () => {
  const dayMs = 24 * 3_600_000;
  const accepted = acceptSpans({ reported: [[0, dayMs]], durationMs: dayMs, elapsedMs: dayMs, rate: 1 });
  expect(coveredMs(accepted, 0, dayMs)).toBe(LONGEST_GAP_MS + ALLOWANCE_MS);
});
