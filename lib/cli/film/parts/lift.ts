import { arrow } from "@/lib/cli/film/parts/annotations";
import { CAUTION, group, INK, line, PAINT, path, rect, STEEL, STEEL_DARK } from "@/lib/cli/film/svg";

/** The post of a two-post lift with its rack, seen from the side; `top` and `foot` are heights in the picture. */
export function liftPost(x: number, top: number, foot: number): string {
  const teeth = Array.from({ length: Math.floor((foot - top - 60) / 28) }, (_, index) => line(x - 20, top + 40 + index * 28, x + 4, top + 40 + index * 28, INK, 3));
  return rect(x - 30, top, 60, foot - top, STEEL_DARK) + teeth.join("") + rect(x - 80, foot - 14, 160, 22, STEEL_DARK);
}

/** Carriage and two arms with pads; `y` is the height of the pads' faces. */
export function liftArms(x: number, y: number, reach: number, pads: string): string {
  return (
    rect(x - 38, y + 4, 76, 66, STEEL) +
    [-1, 1].map((side) => path(`M${x + side * 30} ${y + 30} L${x + side * reach} ${y + 20} l0 14 L${x + side * 30} ${y + 56} Z`, STEEL)).join("") +
    [-1, 1].map((side) => rect(x + side * reach - 18, y, 36, 22, pads)).join("")
  );
}

/** The lock's pawl, in its rack or out of it. */
export const liftLock = (x: number, y: number, engaged: number): string =>
  group({ x, y, turn: -38 * (1 - engaged) }, path("M0 -10 L-46 -10 L-58 4 L0 14 Z", engaged > 0.9 ? CAUTION : STEEL)) + (engaged > 0.9 ? arrow(x + 96, y, x + 26, y, PAINT) : "");
