import { readFileSync } from "node:fs";
import { describe, expect, test } from "vitest";

const css = readFileSync("app/globals.css", "utf8");

/** Every colour by day (0) or in the dark (1), from `--name: #rrggbb` and `--name: light-dark(#rrggbb, #rrggbb)` of the first block. */
function tokensOf(theme: 0 | 1): Map<string, string> {
  const block = css.slice(css.indexOf(":root {"), css.indexOf("}", css.indexOf(":root {")));
  return new Map(
    [...block.matchAll(/--([a-z0-9-]+):\s*([^;]+);/g)].map(([, name = "", value = ""]) => {
      const colours = value.match(/#[0-9a-f]{6}/g) ?? [];
      return [name, colours[theme] ?? colours[0] ?? ""];
    }),
  );
}

// Source: WCAG 2.2, "relative luminance" and "contrast ratio".
function luminance(hex: string): number {
  const [red = 0, green = 0, blue = 0] = [1, 3, 5].map((at) => {
    const channel = Number.parseInt(hex.slice(at, at + 2), 16) / 255;
    return channel <= 0.04045 ? channel / 12.92 : ((channel + 0.055) / 1.055) ** 2.4;
  });
  return 0.2126 * red + 0.7152 * green + 0.0722 * blue;
}
function contrast(a: string, b: string): number {
  const [light = 0, dark = 0] = [luminance(a), luminance(b)].toSorted((x, y) => y - x);
  return (light + 0.05) / (dark + 0.05);
}

// Source: published pairs; #767676 passes 4.5 on white and #777777 doesn't.
test.each([
  ["#767676", "#ffffff", 4.5422],
  ["#777777", "#ffffff", 4.4781],
  ["#000000", "#ffffff", 21],
])("%s on %s is %f", (a, b, expected) => expect(contrast(a, b)).toBeCloseTo(expected, 4));

const GROUNDS = ["enamel", "sheet", "chalk", "tint"];
const TEXT: [string, string][] = [
  ...["ink", "ink2"].flatMap((text) => GROUNDS.map((ground): [string, string] => [text, ground])),
  ...["enamel", "sheet", "chalk", "tint"].map((ground): [string, string] => ["strong", ground]),
  ...["enamel", "sheet", "chalk"].map((ground): [string, string] => ["paint-text", ground]),
  ["strong-ink", "strong"],
  ["paint-ink", "paint"],
  ["deep-ink", "deep"],
  ["deep-soft", "deep"],
  ["deep-ink", "film"],
  ["deep-soft", "film"],
  ["chalk", "ink"],
  ["caution-ink", "caution"],
];
/** Edges of controls, parts of the bolt, marks of what is chosen. */
const CONTROLS: [string, string][] = [
  ["steel", "enamel"],
  ["steel", "sheet"],
  ["steel", "chalk"],
  ["strong", "chalk"],
  ["paint", "sheet"],
  ["steel", "tint"],
  ["strong", "tint"],
  ["strong", "enamel"],
  ["line", "tint"],
  ["line", "sheet"],
  ["line", "chalk"],
  ["line", "enamel"],
  ["deep-line", "deep"],
  ["caution-ink", "caution"],
];

test("both themes are read, each with colours of its own", () => {
  expect(tokensOf(0).get("ink")).not.toBe(tokensOf(1).get("ink"));
  expect([...tokensOf(0).values(), ...tokensOf(1).values()].filter((colour) => !/^#[0-9a-f]{6}$/.test(colour))).toEqual([]);
});

describe.each([
  ["light", tokensOf(0)],
  ["dark", tokensOf(1)],
] as [string, Map<string, string>][])("%s", (_, tokens) => {
  const of = ([a, b]: [string, string]) => contrast(tokens.get(a) ?? "", tokens.get(b) ?? "");
  // Never rounded up before comparing (WCAG 2.2, 1.4.3 and 1.4.11).
  test.each(TEXT)("text %s on %s reaches 4.5", (...pair) => expect(of(pair)).toBeGreaterThanOrEqual(4.5));
  test.each(CONTROLS)("%s beside %s reaches 3", (...pair) => expect(of(pair)).toBeGreaterThanOrEqual(3));
});
