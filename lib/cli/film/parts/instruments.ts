import { CHALK, circle, group, INK, line, PAINT, path, polar, rect, STEEL, STEEL_DARK, STEEL_LIGHT, stroke, text } from "@/lib/cli/film/svg";

/** The green of a plain liquid crystal display. */
const DISPLAY = "#DCE5D6";

/** A window with figures. */
export const display = (x: number, y: number, width: number, figures: string, size = 44): string =>
  rect(x, y, width, size * 1.45, DISPLAY) + text(x + width - 14, y + size * 1.08, figures, { size, fill: INK, anchor: "end", font: "reading", weight: 600 });

/** A micrometer lying level, its anvils at the left about its origin and `gap` pixels apart, with its reading. */
export function micrometer(x: number, y: number, gap: number, reading: string, turn = 0): string {
  return group(
    { x, y, turn },
    path(`M${-gap / 2 - 16} -18 C${-gap / 2 - 50} -18 ${-gap / 2 - 60} 30 ${-gap / 2 - 40} 80 C-10 150 90 150 120 60 L120 24 L80 24 L80 46 C60 100 0 100 ${-gap / 2 - 8} 50 L${-gap / 2} 18 L${-gap / 2} -18 Z`, STEEL),
    rect(gap / 2, -11, 84 - gap / 2, 22, STEEL_LIGHT),
    rect(80, -24, 110, 48, STEEL_LIGHT),
    rect(184, -32, 96, 64, STEEL_DARK),
    ...[-18, -6, 6, 18].map((at) => line(188, at, 276, at, STEEL, 2)),
    rect(280, -18, 34, 36, STEEL),
    turn === 0 ? display(44, 64, 176, reading, 42) : "",
  );
}

/** A dial gauge with two hundredths a mark; `reading` in mm, needle straight up at zero, its plunger downwards. */
export function dialGauge(x: number, y: number, r: number, reading: number, swing: number | null = null): string {
  const degrees = (mm: number): number => -90 + mm * 1800;
  const marks = Array.from({ length: 20 }, (_, index) => {
    const long = index % 5 === 0;
    const [x1, y1] = polar(0, 0, r * 0.86, -90 + index * 18);
    const [x2, y2] = polar(0, 0, r * (long ? 0.7 : 0.77), -90 + index * 18);
    return line(x1, y1, x2, y2, INK, long ? 4 : 2);
  });
  const figures = [0, 5, 10, 15].map((hundredths) => {
    const [fx, fy] = polar(0, 0, r * 0.55, degrees(hundredths / 100));
    return text(fx, fy + r * 0.07, String(hundredths), { size: r * 0.22, fill: INK, anchor: "middle", font: "reading" });
  });
  const [nx, ny] = polar(0, 0, r * 0.8, degrees(reading));
  const sector = swing === null ? "" : path(`M0 0 L0 ${-r * 0.9} A${r * 0.9} ${r * 0.9} 0 0 1 ${polar(0, 0, r * 0.9, degrees(swing)).join(" ")} Z`, PAINT, { opacity: "0.35", stroke: "none" });
  return group(
    { x, y },
    rect(-9, r * 0.9, 18, r * 0.75, STEEL_LIGHT),
    circle(0, r * 1.7, 9, STEEL_DARK),
    circle(0, 0, r, STEEL),
    circle(0, 0, r * 0.9, CHALK),
    sector,
    ...marks,
    ...figures,
    text(0, r * 0.38, "0.01 mm", { size: r * 0.17, fill: STEEL_DARK, anchor: "middle" }),
    line(0, 0, nx, ny, PAINT, 6),
    circle(0, 0, r * 0.08, INK),
  );
}

/** A torque wrench, 460 long, its socket at its origin, handle to the right, with the value in its window. */
export function torqueWrench(x: number, y: number, set: string, turn = 0, name = ""): string {
  return group(
    { x, y, turn },
    rect(30, -11, 230, 22, STEEL_LIGHT),
    rect(220, -27, 130, 54, STEEL),
    rect(350, -24, 130, 48, STEEL_DARK, { rx: 20 }),
    ...[374, 394, 414, 434, 454].map((at) => line(at, -20, at, 20, INK, 2)),
    path("M-34 0 C-34 -44 34 -44 46 -12 L46 12 C34 44 -34 44 -34 0 Z", STEEL),
    circle(0, 0, 17, STEEL_DARK),
    rect(232, -21, 106, 42, DISPLAY),
    text(285, 13, set, { size: 36, fill: INK, anchor: "middle", font: "reading" }),
    name === "" ? "" : text(146, -24, name, { size: 28, anchor: "middle" }),
  );
}

/** A hand meter with two leads to two points. */
export function handMeter(x: number, y: number, figures: string, unit: string, name: string, leads: [number, number][] = []): string {
  const wires = leads.map(([toX, toY], index) => {
    const fromX = x + 80 + index * 80;
    return stroke(`M${fromX} ${y + 300} C${fromX} ${y + 400} ${toX} ${toY - 56} ${toX} ${toY}`, index === 0 ? STEEL : PAINT, 6);
  });
  return (
    wires.join("") +
    group(
      { x, y },
      rect(0, 0, 240, 310, STEEL_DARK, { rx: 12 }),
      display(22, 26, 196, figures, 58),
      text(120, 148, `${unit}`, { size: 34, anchor: "middle" }),
      circle(120, 212, 44, STEEL),
      line(120, 212, 146, 184, CHALK, 6),
      text(120, 290, name, { size: 26, anchor: "middle" }),
    )
  );
}
