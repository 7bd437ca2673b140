import { CHALK, circle, group, INK, path, polar, STEEL, STEEL_DARK, STEEL_LIGHT, stroke, tenth, text } from "@/lib/cli/film/svg";

/** A pulley on the belt's way. `side` 1: the belt goes round it clockwise, ribs inside; −1: its back runs on a smooth one. */
export type Pulley = { name: string; x: number; y: number; r: number; side: 1 | -1; label: [number, number] };

export const PULLEYS: Pulley[] = [
  { name: "Crank", x: 330, y: 396, r: 74, side: 1, label: [330, 504] },
  { name: "Tensioner", x: 190, y: 290, r: 36, side: -1, label: [84, 466] },
  { name: "Alternator", x: 150, y: 120, r: 46, side: 1, label: [150, 52] },
  { name: "Idler", x: 320, y: 190, r: 34, side: -1, label: [320, 136] },
  { name: "Water pump", x: 480, y: 122, r: 58, side: 1, label: [480, 40] },
  { name: "Compressor", x: 606, y: 330, r: 60, side: 1, label: [684, 436] },
];

/** Straight run between two pulleys: where the belt leaves the first and meets the second. */
export function run(from: Pulley, to: Pulley): [number, number, number, number] {
  const [dx, dy] = [to.x - from.x, to.y - from.y];
  const length = Math.hypot(dx, dy);
  const [a, b] = [from.side * from.r, to.side * to.r];
  const along = (a - b) / length;
  const across = Math.sqrt(1 - along * along);
  // Unit normal to the run, on the belt's left: both pulleys' edges lie on it, at their own side's distance.
  const [nx, ny] = [(dx / length) * along + (dy / length) * across, (dy / length) * along - (dx / length) * across];
  return [from.x + nx * a, from.y + ny * a, to.x + nx * b, to.y + ny * b];
}

/** The belt's way round all pulleys in their order, as path data. `thick` moves it out by half its thickness. */
export function beltPath(pulleys: readonly Pulley[], thick = 0): string {
  const grown = pulleys.map((pulley) => ({ ...pulley, r: pulley.r + thick }));
  const at = (index: number): Pulley => grown[index % grown.length] as Pulley;
  const runs = grown.map((pulley, index) => run(pulley, at(index + 1)));
  const first = runs[0] as [number, number, number, number];
  let d = `M${tenth(first[0])} ${tenth(first[1])}`;
  runs.forEach(([, , x, y], index) => {
    const round = at(index + 1);
    const [outX, outY] = runs[(index + 1) % runs.length] as [number, number, number, number];
    const [enter, leave] = [Math.atan2(y - round.y, x - round.x), Math.atan2(outY - round.y, outX - round.x)];
    const sweep = (((leave - enter) * round.side) % (2 * Math.PI) + 2 * Math.PI) % (2 * Math.PI);
    d += ` L${tenth(x)} ${tenth(y)} A${tenth(round.r)} ${tenth(round.r)} 0 ${sweep > Math.PI ? 1 : 0} ${round.side === 1 ? 1 : 0} ${tenth(outX)} ${tenth(outY)}`;
  });
  return `${d} Z`;
}

/** A pulley from the front; grooved ones show their grooves as rings. */
export function pulleyFace({ x, y, r, side }: Pulley, turn = 0): string {
  const spots = [0, 120, 240].map((angle) => circle(...polar(0, 0, r * 0.55, angle), r * 0.12, STEEL_DARK, { "stroke-width": 2 }));
  return group(
    { x, y, turn },
    circle(0, 0, r, side === 1 ? STEEL : STEEL_LIGHT),
    side === 1 ? circle(0, 0, r * 0.86, "none", { "stroke-width": 2 }) : "",
    ...spots,
    circle(0, 0, r * 0.22, STEEL_DARK),
  );
}

type Routing = { pulleys?: Pulley[]; belt?: boolean; drawn?: number; labels?: number; turn?: number; colour?: string };

/** A belt's rubber, light enough to be seen before a dark engine. */
export const BELT_RUBBER = "#54645E";

/** A belt along a way, with its ribs hinted at. */
export const strap = (way: string): string => stroke(way, INK, 16) + stroke(way, BELT_RUBBER, 11) + stroke(way, "#A9B7B0", 2, { "stroke-dasharray": "10 8" });

/** Where the tensioner's arm turns, and where its pin goes. */
export const PIVOT: [number, number] = [104, 384];

function tensionerArm({ x, y }: Pulley): string {
  const [px, py] = PIVOT;
  const [dx, dy] = [x - px, y - py];
  const length = Math.hypot(dx, dy);
  return group({ x: px, y: py, turn: (Math.atan2(dy, dx) * 180) / Math.PI }, path(`M0 -30 L${tenth(length)} -18 L${tenth(length)} 18 L0 30 Z`, STEEL_DARK)) + circle(px, py, 40, STEEL) + circle(px, py, 12, INK);
}

/** All pulleys with their belt. `drawn` 0–1: how much of the belt's way is drawn as a line; `labels`: how many pulleys are named. */
export function routing({ pulleys = PULLEYS, belt = true, drawn, labels = 0, turn = 0, colour = CHALK }: Routing): string {
  const way = beltPath(pulleys, 5);
  const faces = pulleys.map((pulley) => pulleyFace(pulley, (turn * 74 * pulley.side) / pulley.r)).join("");
  const arm = pulleys.filter((pulley) => pulley.name === "Tensioner").map(tensionerArm).join("");
  const trace = drawn === undefined ? "" : stroke(way, colour, 6, { pathLength: 100, "stroke-dasharray": `${tenth(drawn * 100)} 200`, opacity: drawn > 0 ? undefined : "0" });
  const names = pulleys.slice(0, labels).map((pulley) => text(...pulley.label, pulley.name, { anchor: "middle", size: 32 }));
  return arm + faces + (belt ? strap(way) : "") + trace + names.join("");
}
