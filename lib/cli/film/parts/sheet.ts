import { CHALK, group, INK, line, rect, STEEL, STEEL_LIGHT, text } from "@/lib/cli/film/svg";

/** A sheet on a clipboard: heading, then rows already drawn in its own coordinates. */
export function sheet(x: number, y: number, width: number, height: number, heading: string, rows: string): string {
  return group(
    { x, y },
    rect(0, 0, width, height, CHALK),
    rect(width / 2 - 60, -18, 120, 34, STEEL),
    line(24, 76, width - 24, 76, INK, 3),
    text(24, 62, heading, { size: 38, fill: INK, weight: 700 }),
    rows,
  );
}

/** One row of a sheet: what it is, and a value at the right. */
export const row = (y: number, width: number, name: string, value: string, fill = INK): string =>
  text(24, y, name, { size: 32, fill, weight: 500 }) +
  text(width - 24, y, value, { size: 32, fill, anchor: "end", font: "reading" }) +
  line(24, y + 16, width - 24, y + 16, STEEL_LIGHT, 2);
