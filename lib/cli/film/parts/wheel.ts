import { boltHead } from "@/lib/cli/film/parts/bolt-head";
import { circle, group, path, polar, RUBBER, STEEL, STEEL_DARK, STEEL_LIGHT, tenth } from "@/lib/cli/film/svg";

/** Angle of one of the five wheel bolts, in degrees; the first is on top. */
export const boltAngle = (index: number): number => -90 + index * 72;

type Wheel = { turns?: number[]; fills?: string[] };

/** A road wheel from the front. `turns` and `fills` are for its five bolts. */
export function wheel(x: number, y: number, r: number, { turns = [], fills = [] }: Wheel = {}): string {
  const spokes = [0, 1, 2, 3, 4].map((index) => {
    const angle = boltAngle(index) + 36;
    const corner = (radius: number, by: number): string => polar(0, 0, radius, angle + by).map(tenth).join(" ");
    return path(`M${corner(r * 0.42, -20)}L${corner(r * 0.7, -22)}A${tenth(r * 0.7)} ${tenth(r * 0.7)} 0 0 1 ${corner(r * 0.7, 22)}L${corner(r * 0.42, 20)}Z`, STEEL_DARK);
  });
  const bolts = [0, 1, 2, 3, 4].map((index) => {
    const [bx, by] = polar(0, 0, r * 0.24, boltAngle(index));
    return boltHead(bx, by, r * 0.065, { turn: turns[index] ?? 0, fill: fills[index] ?? STEEL_LIGHT });
  });
  return group({ x, y }, circle(0, 0, r, RUBBER), circle(0, 0, r * 0.78, STEEL), ...spokes, circle(0, 0, r * 0.36, STEEL), ...bolts, circle(0, 0, r * 0.1, STEEL_DARK));
}
