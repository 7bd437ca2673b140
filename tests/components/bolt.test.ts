import { createElement } from "react";
import { renderToStaticMarkup } from "react-dom/server";
import { describe, expect, test } from "vitest";
import { Bolt } from "@/components/bolt/bolt";
import { BoltLegend, LEGEND } from "@/components/bolt/bolt-legend";
import { NEXT_STATES, type Held, type Standing } from "@/lib/core/standing/types";

const draw = (standing: Standing, more: { size?: number; label?: string; drawn?: boolean } = {}) => renderToStaticMarkup(createElement(Bolt, { standing, ...more }));
/** Shapes alone: colours, words and numbers taken away. */
const shapeOf = (svg: string) => svg.replace(/ (?:fill|stroke|aria-label|width|height)="[^"]*"/g, "").replace(/>\d</g, "><");

const HELD: Held[] = [
  { kind: "nothing" },
  { kind: "level", level: 4, until: "2027-12-01" },
  { kind: "recheck_due", level: 4, because: "expired" },
  { kind: "withdrawn", level: 4 },
];

describe.each([16, 44])("at %i px", (size) => {
  // A bolt that is held looks the same while nothing is under way: not open and open are one to it.
  const standings = HELD.flatMap((held) => NEXT_STATES.filter((next) => held.kind === "nothing" || next !== "not_open").map((next): Standing => ({ held, next })));

  test("every standing has a shape of its own, so that colour is never the only sign", () => {
    const shapes = standings.map((standing) => shapeOf(draw(standing, { size })));
    expect(standings).toHaveLength(21);
    expect(new Set(shapes).size).toBe(standings.length);
  });
});

test("the level is stamped on what is held or was held, and not on what was withdrawn", () => {
  expect(HELD.map((held) => draw({ held, next: "open" }).includes(">4<"))).toEqual([false, true, true, false]);
});

test("it is a picture with words, or hidden where words stand beside it", () => {
  const standing: Standing = { held: { kind: "level", level: 3, until: "2027-12-01" }, next: "ready" };
  expect(draw(standing)).toContain('role="img" aria-label="Signed off, level 3, until Wed 1 Dec 2027 · ready to be observed"');
  expect(draw(standing, { label: "" })).toContain('aria-hidden="true"');
});

test("the line is drawn only where a sign-off has just been made", () => {
  const standing: Standing = { held: { kind: "level", level: 3, until: "2027-12-01" }, next: "open" };
  expect(draw(standing)).not.toContain("line-drawn");
  expect(draw(standing, { drawn: true }).match(/line-drawn/g)).toHaveLength(1);
});

test("the legend shows each of its bolts with words", () => {
  const legend = renderToStaticMarkup(createElement(BoltLegend));
  expect(LEGEND.filter(({ words }) => !legend.includes(words))).toEqual([]);
  expect(legend.match(/<svg/g)).toHaveLength(LEGEND.length);
});
