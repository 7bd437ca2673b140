import { between, glide, stage, type Picture } from "@/lib/cli/film/moment";
import { arrow, panel } from "@/lib/cli/film/parts/annotations";
import { boltHead } from "@/lib/cli/film/parts/bolt-head";
import { calliper, carrier, reservoir } from "@/lib/cli/film/parts/calliper";
import { discFace, pad } from "@/lib/cli/film/parts/disc";
import { dialGauge, torqueWrench } from "@/lib/cli/film/parts/instruments";
import { row, sheet } from "@/lib/cli/film/parts/sheet";
import { boltAngle, wheel } from "@/lib/cli/film/parts/wheel";
import { CHALK, circle, group, INK, line, PAINT, path, polar, rect, RUBBER, SOFT, STEEL, STEEL_DARK, STEEL_LIGHT, stroke, tenth, text } from "@/lib/cli/film/svg";

/** Which spot the gauge's foot stands on. */
const touch = (fromX: number, fromY: number, x: number, y: number): string => line(fromX, fromY, x, y, CHALK, 3, { "stroke-dasharray": "10 8" }) + circle(x, y, 11, PAINT);

const hub: Picture = (since) => {
  const clean = glide(since(0), 400, 2200);
  const spin = Math.min(1, Math.max(0, (since(0) - 3000) / 3000));
  const studs = [0, 1, 2, 3, 4].map((index) => circle(...polar(0, 0, 92, boltAngle(index)), 17, INK)).join("");
  return (
    group({ x: 240, y: 270, turn: spin * 72 }, circle(0, 0, 190, STEEL_DARK), circle(0, 0, 160, "#8A6A4E"), group({ opacity: clean }, circle(0, 0, 160, STEEL_LIGHT)), circle(0, 0, 50, STEEL), studs) +
    dialGauge(600, 170, 130, 0.01 * Math.sin(spin * Math.PI) * (spin > 0 ? 1 : 0) + (spin >= 1 ? 0.01 : 0), spin >= 1 ? 0.01 : null) +
    (spin < 1 && clean > 0.05 && clean < 0.95 ? group({ x: 150 + 150 * clean, y: 190 + 60 * Math.sin(clean * 9), turn: 30 }, rect(-16, -16, 150, 26, "#9C6B3F"), rect(-60, -16, 60, 40, STEEL)) : "") +
    text(240, 510, spin > 0 ? "Bare metal" : "Wire brush, then wipe", { anchor: "middle", size: 36 }) +
    touch(600, 384, 376, 336)
  );
};

/** What the gauge shows while the disc is turned once round: from nothing up to the run-out and back. */
const sweep = (runOut: number, part: number): number => (runOut * (1 - Math.cos(2 * Math.PI * part))) / 2;

const runOut: Picture = (since) => {
  const first = Math.min(1, Math.max(0, (since(1) - 300) / 1800));
  const index = glide(since(2), 400, 1200);
  const second = Math.min(1, Math.max(0, (since(2) - 1900) / 1800));
  const indexed = since(2) > 1600;
  const reading = indexed ? sweep(0.03, second) : sweep(0.07, first);
  const swing = indexed ? (second >= 1 ? 0.03 : null) : first >= 1 ? 0.07 : null;
  return (
    discFace(250, 260, 226, { turn: (since(1) < 0 ? 0 : first * 360) + index * 144 + second * 360, mark: PAINT }) +
    dialGauge(616, 166, 140, reading, swing) +
    touch(616, 404, 432, 346) +
    text(616, 506, swing === null ? (since(1) < 0 ? "All bolts on" : "One full turn") : `${swing.toFixed(2)} mm`, { anchor: "middle", size: 52, font: swing === null ? "plate" : "reading", fill: swing === 0.07 ? PAINT : CHALK }) +
    (index > 0 && second === 0 ? text(616, 456, "Two holes on", { anchor: "middle", size: 42, fill: PAINT }) : "")
  );
};

const range = (y: number, name: string, from: number, to: number, at: number): string => {
  const x = (newtonMetres: number): number => 60 + newtonMetres * 3.3;
  return (
    rect(x(from), y - 24, x(to) - x(from), 48, at >= from && at <= to ? CHALK : STEEL_DARK) +
    text(x(to) + (to > 100 ? -14 : 14), y + 13, name, { size: 34, anchor: to > 100 ? "end" : "start", fill: to > 100 && at >= from && at <= to ? INK : CHALK }) +
    text(x(from), y + 58, String(from), { size: 30, anchor: "middle", font: "reading" }) +
    text(x(to), y + 58, String(to), { size: 30, anchor: "middle", font: "reading" })
  );
};

const ranges = (at: number): string =>
  range(350, "TW-1", 5, 50, at) + range(450, "TW-2", 20, 200, at) + line(60 + at * 3.3, 300, 60 + at * 3.3, 486, PAINT, 6) + text(60 + at * 3.3, 288, String(at), { size: 44, anchor: "middle", font: "reading", fill: PAINT });

const discScrew: Picture = (since) => {
  const turn = -16 * glide(since(0), 600, 1200) + 2 * glide(since(0), 1900, 150);
  return torqueWrench(150, 140, "10", turn, "TW-1") + group({ opacity: glide(since(0), 2600, 500) }, ranges(10));
};

const newPads: Picture = (since) => {
  const closed = glide(since(0), 500, 1400);
  const shown = (at: number): number => glide(since(0), at, 500);
  return (
    rect(350, 50, 80, 400, STEEL_LIGHT) +
    pad(between(90, 232, closed), 250, 280, 98, 1) +
    pad(between(690, 548, closed), 250, 280, 98, -1) +
    text(200, 44, "Inner", { anchor: "middle", size: 40 }) +
    text(580, 44, "Outer", { anchor: "middle", size: 40 }) +
    group({ opacity: shown(2300) }, stroke("M242 410 q-60 60 -120 40", PAINT, 6), circle(242, 404, 10, PAINT), text(30, 500, "Wear sensor", { size: 36, fill: PAINT })) +
    group({ opacity: shown(4200) }, arrow(640, 462, 500, 392, CHALK, 4), text(650, 500, "Chamfer", { anchor: "middle", size: 36 }))
  );
};

const carrierTorque: Picture = (since) => {
  const fitted = glide(since(0), 500, 700);
  const turn = -22 * glide(since(0), 2600, 1400) + 3 * glide(since(0), 4050, 120);
  const painted = glide(since(1), 700, 900);
  const clicked = since(0) > 4050;
  return (
    group({ x: 170, y: 260, scale: 1.7 }, carrier(0, 0)) +
    boltHead(126, 104, 34, { fill: fitted > 0.5 ? CHALK : STEEL, painted: painted > 0 ? painted : 0 }) +
    boltHead(126, 416, 34, { fill: fitted > 0.5 ? CHALK : STEEL, painted: glide(since(1), 1700, 900) }) +
    (since(1) < 0 ? group({ opacity: glide(since(0), 1800, 500) }, torqueWrench(126, 104, "105", 14 + turn, "TW-2")) : "") +
    (fitted > 0.5 && since(1) < 0 ? text(250, 470, "New bolts, every time", { size: 40 }) : "") +
    (clicked && since(1) < 0 ? stroke("M66 50 L46 30 M126 40 L126 12 M186 50 L206 30", PAINT, 8) : "") +
    (since(1) >= 0 ? boltHead(540, 250, 120, { fill: CHALK, painted }) + text(540, 470, "Seen at a glance if it moves", { anchor: "middle", size: 38 }) : "")
  );
};

const pinTorque: Picture = (since) => {
  const turn = -18 * glide(since(0), 900, 1200) + 3 * glide(since(0), 2150, 120);
  return group({ x: 200, y: 134 }, calliper(0, 0)) + torqueWrench(156, 50, "28", 22 + turn, "TW-1") + group({ opacity: glide(since(0), 2300, 500) }, ranges(28));
};

const pedal: Picture = (since) => {
  const strokes = Math.max(0, since(0) - 200) / 700;
  const depth = Math.max(0.06, 1 - Math.floor(strokes) * 0.26);
  const pressed = since(0) < 3400 ? depth * Math.abs(Math.sin(Math.min(strokes, 4.8) * Math.PI)) : 0.06;
  const level = glide(since(0), 3600, 1200);
  return (
    line(40, 470, 420, 470, STEEL, 8) +
    text(230, 512, "floor", { anchor: "middle", size: 32, fill: SOFT }) +
    group({ x: 130, y: 60, turn: -6 - 34 * (1 - pressed) + 22 }, rect(-16, 0, 32, 330, STEEL), rect(-30, 320, 130, 34, RUBBER), circle(0, 0, 24, STEEL_DARK)) +
    text(250, 110, since(0) > 3400 ? "Hard" : "Pump", { size: 64, fill: since(0) > 3400 ? PAINT : CHALK, weight: 700 }) +
    reservoir(540, 180, between(0.5, 0.84, level), glide(since(0), 3300, 400) * (1 - glide(since(0), 5200, 400))) +
    line(586, 208, 520, 208, CHALK, 2) +
    text(508, 220, "MAX", { size: 36, anchor: "end", fill: level > 0.95 ? PAINT : CHALK })
  );
};

/** Star order: each bolt is followed by the next but one. */
const STAR = [0, 2, 4, 1, 3];

const wheelStar: Picture = (since) => {
  const done = stage(since(0), 2900, 800, 5);
  const fills = [0, 1, 2, 3, 4].map((bolt) => (STAR.indexOf(bolt) < done ? PAINT : CHALK));
  const spot = (bolt: number, r: number): [number, number] => polar(340, 256, r, boltAngle(bolt));
  const way = STAR.slice(0, done).map((bolt, index) => `${index === 0 ? "M" : "L"}${spot(bolt, 58).map(tenth).join(" ")}`);
  const numbers = STAR.slice(0, done).map((bolt, index) => {
    const [x, y] = spot(bolt, 118);
    return circle(x, y, 25, INK, { stroke: PAINT }) + text(x, y + 13, String(index + 1), { anchor: "middle", size: 38, weight: 700 });
  });
  return line(20, 503, 760, 503, STEEL, 6) + wheel(340, 256, 242, { fills }) + (done > 1 ? stroke(way.join(" "), PAINT, 5) : "") + numbers.join("") + text(770, 496, "on the ground", { anchor: "end", size: 34 });
};

const rollers: Picture = (since) => {
  const force = (kilonewtons: number): number => 130 * kilonewtons * glide(since(0), 400, 2200);
  const bar = (x: number, name: string, kilonewtons: number): string =>
    rect(x, 400 - force(kilonewtons), 120, force(kilonewtons), STEEL_LIGHT) +
    text(x + 60, 384 - force(kilonewtons), (force(kilonewtons) / 130).toFixed(2), { anchor: "middle", size: 46, font: "reading" }) +
    text(x + 60, 446, `${name}, kN`, { anchor: "middle", size: 34 });
  return (
    line(40, 401, 400, 401, CHALK, 4) +
    bar(70, "Left", 2.4) +
    bar(240, "Right", 2.16) +
    group(
      { x: 450, y: 150, opacity: glide(since(0), 5200, 600) },
      panel(0, 0, 320, 190),
      text(160, 70, "high − low", { anchor: "middle", size: 50 }),
      line(50, 95, 270, 95, CHALK, 4),
      text(160, 152, "high", { anchor: "middle", size: 50 }),
    )
  );
};

const road: Picture = (since) => {
  const count = stage(since(0), 1800, 360, 10);
  const stop = (index: number): string => `L${80 + index * 66} 130 L${112 + index * 66} 340 L${140 + index * 66} 130`;
  const way = `M60 130 ${Array.from({ length: count }, (_, index) => stop(index)).join(" ")}`;
  return (
    line(60, 130, 750, 130, STEEL_DARK, 2, { "stroke-dasharray": "8 8" }) +
    line(60, 340, 750, 340, STEEL_DARK, 2, { "stroke-dasharray": "8 8" }) +
    text(60, 112, "50 km/h", { size: 34 }) +
    text(60, 386, "15 km/h", { size: 34 }) +
    (count > 0 ? stroke(way, CHALK, 6) : "") +
    text(390, 480, count === 0 ? "Imbalance 0.24 / 2.40 = 10 %" : `Gentle stop ${count} of 10`, { anchor: "middle", size: 46, fill: PAINT })
  );
};

const release: Picture = (since) => {
  const written = glide(since(0), 2200, 1600);
  return sheet(150, 30, 480, 450, "Job card", row(130, 480, "Work", "done") + row(186, 480, "Readings", "written") + row(242, 480, "Road test", "licensed") + text(24, 314, "Released by", { size: 34, fill: INK, weight: 700 }) +
    line(24, 400, 456, 400, INK, 3) +
    stroke("M40 384 c20 -60 40 -60 44 -10 c10 -40 30 -40 36 0 c14 -30 30 -30 40 0 c30 -60 50 -40 44 0 c30 -20 60 -20 120 -12", INK, 5, { pathLength: 100, "stroke-dasharray": `${tenth(written * 100)} 200`, opacity: written > 0 ? undefined : "0" }) +
    text(24, 434, "qualified person, by name", { size: 28, fill: STEEL_DARK, weight: 500 })) + path("M640 420 l-20 -60 l14 -8 l26 58 Z", written > 0 && written < 1 ? PAINT : "none", { stroke: "none" });
};

/** Closing page: what to keep, each held by a bolt with its line. */
export const recap = (points: readonly string[]): Picture => (since) =>
  points
    .map((point, index) => {
      const ms = since(0) - 500 - index * 2100;
      return group({ x: 60, y: 84 + index * 118, opacity: glide(ms, 0, 400) }, boltHead(0, 0, 32, { fill: CHALK, painted: glide(ms, 300, 400) }), text(76, 17, point, { size: 52 }));
    })
    .join("");

export const DISCS_FIT: Record<string, Picture> = {
  hub,
  "run-out": runOut,
  "disc-screw": discScrew,
  "new-pads": newPads,
  "carrier-torque": carrierTorque,
  "pin-torque": pinTorque,
  pedal,
  "wheel-star": wheelStar,
  rollers,
  road,
  release,
  "recap-discs": recap(["The limit decides, not the new size", "Both discs, always by axle", "New carrier bolts, 105 N·m", "A hard pedal before it moves"]),
};
