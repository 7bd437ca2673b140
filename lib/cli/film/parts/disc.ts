import { circle, group, INK, path, polar, rect, STEEL, STEEL_DARK, STEEL_LIGHT, tenth } from "@/lib/cli/film/svg";

type Disc = { turn?: number; fill?: string; mark?: string };

/** A brake disc from the front. `mark` paints a spot at one hole, so that its turning can be followed. */
export function discFace(x: number, y: number, r: number, { turn = 0, fill = STEEL_LIGHT, mark }: Disc = {}): string {
  const holes = [0, 1, 2, 3, 4].map((index) => circle(...polar(0, 0, r * 0.31, -90 + index * 72), r * 0.055, INK));
  return group(
    { x, y, turn },
    circle(0, 0, r, fill),
    circle(0, 0, r * 0.94, "none", { "stroke-width": 1.5, opacity: "0.5" }),
    circle(0, 0, r * 0.52, STEEL),
    circle(0, 0, r * 0.47, STEEL_LIGHT),
    circle(0, 0, r * 0.17, STEEL_DARK),
    ...holes,
    circle(...polar(0, 0, r * 0.31, -54), r * 0.03, STEEL_DARK),
    mark === undefined ? "" : circle(...polar(0, 0, r * 0.42, -90), r * 0.05, mark, { "stroke-width": 1 }),
  );
}

/** A ventilated disc cut through, standing; `thickness` in pixels. Its origin is the middle of its foot. */
export function discSection(x: number, y: number, height: number, thickness: number, fill = STEEL_LIGHT): string {
  const cheek = thickness * 0.34;
  const vanes = Array.from({ length: Math.floor(height / 42) }, (_, index) => rect(x - thickness / 2 + cheek, y - height + 18 + index * 42, thickness - 2 * cheek, 12, STEEL, { "stroke-width": 2 }));
  return rect(x - thickness / 2, y - height, cheek, height, fill) + rect(x + thickness / 2 - cheek, y - height, cheek, height, fill) + vanes.join("");
}

/** A pad on its backing plate, face towards `side` (1: right); `lining` in pixels. Its origin is the middle of the back of its plate. */
export function pad(x: number, y: number, height: number, lining: number, side: 1 | -1, fill = STEEL_DARK): string {
  const plate = 20;
  return (
    rect(side === 1 ? x : x - plate, y - height / 2 - 12, plate, height + 24, STEEL_LIGHT) +
    path(`M${tenth(x + side * plate)} ${tenth(y - height / 2)} l${tenth(side * lining)} 10 l0 ${tenth(height - 20)} l${tenth(-side * lining)} 10 Z`, fill)
  );
}
