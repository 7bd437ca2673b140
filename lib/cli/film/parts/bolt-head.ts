import { CHALK, circle, group, INK, line, PAINT, path, polar, STEEL, STEEL_LIGHT, tenth, text } from "@/lib/cli/film/svg";

const hexagon = (r: number): string =>
  `M${[0, 1, 2, 3, 4, 5].map((index) => polar(0, 0, r, 60 * index + 30).map(tenth).join(" ")).join("L")}Z`;

type Bolt = { fill?: string; stamp?: string; turn?: number; painted?: number };

/** A bolt head from above on its washer. @param painted how far the paint line is drawn across it, 0 to 1 */
export function boltHead(x: number, y: number, r: number, { fill = STEEL_LIGHT, stamp, turn = 0, painted = 0 }: Bolt = {}): string {
  return group(
    { x, y },
    circle(0, 0, r * 1.24, STEEL),
    group({ turn }, path(hexagon(r), fill, { "stroke-width": 3 })),
    stamp === undefined ? circle(0, 0, r * 0.5, "none", { stroke: INK, "stroke-width": 2, opacity: "0.5" }) : text(0, r * 0.42, stamp, { size: r * 1.2, anchor: "middle", weight: 700, fill: CHALK }),
    painted > 0 ? line(-r * 0.2, r * 0.2, -r * 0.2 + painted * r * 1.9, r * 0.2 - painted * r * 1.9, PAINT, Math.max(5, r * 0.26)) : "",
  );
}
