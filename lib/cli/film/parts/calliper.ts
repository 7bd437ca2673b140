import { CHALK, circle, group, INK, path, rect, RUBBER, STEEL, STEEL_DARK, STEEL_LIGHT, stroke } from "@/lib/cli/film/svg";

/** A sliding calliper from outside, 150 wide; its origin is its middle. */
export function calliper(x: number, y: number, { turn = 0, scale = 1 }: { turn?: number; scale?: number } = {}): string {
  return group(
    { x, y, turn, scale },
    path("M-44 -96 L30 -96 C58 -60 58 60 30 96 L-44 96 L-60 60 L-60 -60 Z", STEEL_LIGHT),
    rect(-30, -52, 46, 104, STEEL, { rx: 20 }),
    circle(-44, -84, 18, STEEL),
    circle(-44, 84, 18, STEEL),
    circle(-44, -84, 8, INK),
    circle(-44, 84, 8, INK),
  );
}

/** The carrier that stays on the knuckle, with its two bolt holes. */
export function carrier(x: number, y: number, scale = 1): string {
  return group(
    { x, y, scale },
    path("M-30 -120 L26 -120 L26 -84 L-2 -76 L-2 76 L26 84 L26 120 L-30 120 L-48 96 L-48 -96 Z", STEEL_DARK),
    circle(-26, -92, 11, INK),
    circle(-26, 92, 11, INK),
  );
}

/** Piston, bore, seal and boot, cut through; `in` from 0 (out) to 1 (pushed back). 300 wide; the pad side is at the right. */
export function pistonBore(x: number, y: number, pushed: number): string {
  const out = 96 * (1 - pushed);
  return group(
    { x, y },
    path("M0 -110 L210 -110 L210 -74 L40 -74 L40 74 L210 74 L210 110 L0 110 Z", STEEL),
    rect(42, -72, 168, 144, "#B98A2E", { stroke: "none" }),
    rect(92 + out, -72, 150, 144, STEEL_LIGHT),
    rect(196, -80, 14, 12, RUBBER),
    rect(196, 68, 14, 12, RUBBER),
    path("M0 -24 L42 -24 L42 24 L0 24 Z", "#B98A2E", { stroke: "none" }),
    stroke("M0 -24 L42 -24 M0 24 L42 24", INK, 3),
    stroke(`M${112 + out} -50 L${112 + out} 50`, STEEL, 3),
  );
}

/** A reservoir with MAX and MIN; `level` 0 to 1; `cap` is how far the cap is lifted. */
export function reservoir(x: number, y: number, level: number, cap: number): string {
  const height = 150;
  const fluid = 30 + level * (height - 44);
  return group(
    { x, y },
    rect(0, 0, 170, height, CHALK, { opacity: "0.9" }),
    rect(3, height - fluid, 164, fluid - 3, "#C79A3A", { stroke: "none" }),
    stroke(`M0 28 L44 28 M0 112 L44 112`, INK, 4),
    rect(0, 0, 170, height, "none"),
    group({ y: -cap * 26, turn: cap * -10 }, rect(40, -34, 90, 30, RUBBER)),
    rect(56, height, 30, 26, STEEL_DARK),
  );
}
