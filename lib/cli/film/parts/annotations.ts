import { CHALK, FIELD, group, HAIRLINE, line, PAINT, path, rect, text, tenth } from "@/lib/cli/film/svg";

/** An arrow head at a point, pointing in `degrees`. */
export const arrowHead = (x: number, y: number, degrees: number, colour = CHALK, size = 14): string =>
  group({ x, y, turn: degrees }, path(`M0 0L${-size} ${tenth(-size * 0.45)}L${-size} ${tenth(size * 0.45)}Z`, colour, { stroke: colour, "stroke-width": 1 }));

/** A straight arrow. */
export function arrow(x1: number, y1: number, x2: number, y2: number, colour = PAINT, width = 6): string {
  const degrees = (Math.atan2(y2 - y1, x2 - x1) * 180) / Math.PI;
  const back = 14;
  const [bx, by] = [x2 - back * Math.cos((degrees * Math.PI) / 180), y2 - back * Math.sin((degrees * Math.PI) / 180)];
  return line(x1, y1, bx, by, colour, width) + arrowHead(x2, y2, degrees, colour, 24);
}

/** A level dimension between two edges, with arrows from outside and the value above. */
export function dimension(x1: number, x2: number, y: number, words: string, colour = CHALK): string {
  return (
    line(x1, y - 16, x1, y + 34, colour, 2) +
    line(x2, y - 16, x2, y + 34, colour, 2) +
    line(x1 - 46, y, x1, y, colour, 3) +
    line(x2, y, x2 + 46, y, colour, 3) +
    arrowHead(x1, y, 0, colour) +
    arrowHead(x2, y, 180, colour) +
    text((x1 + x2) / 2, y - 24, words, { anchor: "middle", size: 36, font: "reading", fill: colour })
  );
}

/** Words beside a part, with a thin line to it. */
export function callout(x: number, y: number, toX: number, toY: number, words: string, anchor: "start" | "end" | "middle" = "start"): string {
  const from = anchor === "start" ? x - 10 : anchor === "end" ? x + 10 : x;
  return line(from, anchor === "middle" ? y + 12 : y - 9, toX, toY, CHALK, 2) + text(x, y, words, { size: 30, anchor });
}

/** A small dark plate for a table or words inside a picture. */
export const panel = (x: number, y: number, width: number, height: number): string =>
  rect(x, y, width, height, FIELD, { stroke: HAIRLINE, "stroke-width": 2 });
