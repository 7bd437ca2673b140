import { between, glide, stage, type Picture } from "@/lib/cli/film/moment";
import { dimension, panel } from "@/lib/cli/film/parts/annotations";
import { discFace, discSection, pad } from "@/lib/cli/film/parts/disc";
import { dialGauge, display, micrometer, torqueWrench } from "@/lib/cli/film/parts/instruments";
import { row, sheet } from "@/lib/cli/film/parts/sheet";
import { CHALK, circle, group, INK, line, PAINT, path, polar, rect, SOFT, STEEL, STEEL_DARK, STEEL_LIGHT, stroke, tenth, text } from "@/lib/cli/film/svg";

const jobCard: Picture = (since) => {
  const shake = since(1) > 600 && since(1) < 3600 ? 5 * Math.sin(since(1) / 55) : 0;
  return (
    group({ x: 30, y: 8 }, sheet(0, 20, 400, 470, "Job card", "" +
      row(130, 400, "Vehicle", "DEMO 001") +
      row(184, 400, "Axle", "front") +
      text(24, 246, "Concern", { size: 32, fill: INK, weight: 500 }) +
      ["“Steering wheel", "shakes when braking", "from motorway speed”"].map((words, index) => text(24, 292 + index * 40, words, { size: 38, fill: INK, weight: 700 })).join("") +
      row(436, 400, "Released by", "", INK) +
      (since(1) > 400 ? stroke(`M24 386 L${tenth(between(24, 340, glide(since(1), 400, 1400)))} 386`, PAINT, 8) : ""))) +
    group(
      { x: 604, y: 250, turn: shake },
      circle(0, 0, 136, "none", { stroke: STEEL_LIGHT, "stroke-width": 26 }),
      path("M-122 -8 L-50 -34 L50 -34 L122 -8 L122 14 L44 26 L18 122 L-18 122 L-44 26 L-122 14 Z", STEEL),
      circle(0, -2, 34, STEEL_DARK),
    ) +
    (shake !== 0 ? stroke("M440 180 q-16 70 0 140 M768 180 q16 70 0 140", CHALK, 5) : "")
  );
};

const limit: Picture = (since) => {
  const worn = glide(since(1), 500, 900);
  return (
    discSection(220, 490, 330, 140) +
    text(220, 48, "New", { anchor: "middle", size: 40 }) +
    dimension(150, 290, 120, "24.0") +
    group(
      { opacity: glide(since(1), 200, 500) },
      discSection(560, 490, 330, between(140, 116, worn)),
      rect(490, 160, between(0, 12, worn), 330, "none", { stroke: PAINT, "stroke-dasharray": "8 8" }),
      rect(between(630, 618, worn), 160, between(0, 12, worn), 330, "none", { stroke: PAINT, "stroke-dasharray": "8 8" }),
      text(560, 48, "Limit", { anchor: "middle", size: 40, fill: PAINT, weight: 700 }),
      dimension(560 - between(70, 58, worn), 560 + between(70, 58, worn), 120, "22.0", PAINT),
    )
  );
};

const tools: Picture = (since) => {
  const count = stage(since(0), 500, 800, 6);
  const drawn = [
    () => micrometer(110, 80, 36, "0.00"),
    () => dialGauge(610, 100, 82, 0),
    () => torqueWrench(70, 282, "10", 0, "TW-1"),
    () => torqueWrench(70, 384, "105", 0, "TW-2"),
    () => stroke("M640 320 l0 70 q0 44 -40 44 q-36 0 -36 -34", STEEL_LIGHT, 12) + text(640, 300, "Hook", { anchor: "middle" }),
    () => group({ x: 120, y: 470 }, rect(0, -14, 200, 28, STEEL), rect(200, -34, 26, 68, STEEL_LIGHT), rect(-30, -34, 26, 68, STEEL_DARK), text(250, 10, "Piston tool")),
  ];
  return drawn.slice(0, count).map((draw) => draw()).join("");
};

const stopRules: Picture = (since) => {
  const count = stage(since(0), 1500, 1500, 3);
  const titles = ["No data", "Lift past its date", "Weeping hose"];
  const signs = [
    () => rect(-62, -92, 124, 160, CHALK) + text(0, 24, "?", { size: 110, fill: INK, anchor: "middle", weight: 700 }),
    () => rect(-80, -80, 160, 140, CHALK) + rect(-80, -80, 160, 36, STEEL_DARK) + text(0, 20, "−5 days", { size: 42, fill: INK, anchor: "middle" }),
    () =>
      stroke("M-90 -70 C-30 -70 30 -60 40 0 C46 40 70 50 92 50", INK, 34) +
      stroke("M-90 -70 C-30 -70 30 -60 40 0 C46 40 70 50 92 50", STEEL_DARK, 26) +
      path("M30 40 q-16 26 0 36 q16 -10 0 -36 Z", "#C79A3A"),
  ];
  return signs
    .slice(0, count)
    .map((draw, index) => group({ x: 100 + index * 290, y: 220 }, draw(), line(-88, 100, 88, -110, PAINT, 14), text(0, 178, titles[index] ?? "", { anchor: "middle", size: 42 })))
    .join("");
};

const pads: Picture = (since) => {
  const grown = glide(since(0), 1400, 700);
  return (
    discSection(390, 470, 380, 110) +
    pad(300 - 22, 280, 260, 34, 1) +
    pad(510 - 8, 280, 260, 54, -1) +
    text(180, 70, "Inner", { anchor: "middle", size: 40 }) +
    text(610, 70, "Outer", { anchor: "middle", size: 40 }) +
    group(
      { opacity: grown },
      text(180, 140, "2.2", { anchor: "middle", size: 72, font: "reading", fill: PAINT }),
      text(180, 184, "mm", { anchor: "middle", size: 34 }),
    ) +
    group(
      { opacity: glide(since(0), 2800, 700) },
      text(610, 140, "5.1", { anchor: "middle", size: 72, font: "reading" }),
      text(610, 184, "mm", { anchor: "middle", size: 34 }),
    ) +
    stroke("M200 210 L292 262", PAINT, 3) +
    stroke("M590 210 L474 262", CHALK, 3)
  );
};

const LEFT = ["21.88", "21.90", "21.91", "21.89", "21.87", "21.88", "21.90", "21.92"];

/** A micrometer that reaches over the disc's edge, as seen from the front: its frame, and its anvil 10 mm in. */
const micrometerEndOn = (x: number, y: number, r: number, degrees: number): string =>
  group({ x, y, turn: degrees }, rect(r - 40, -15, 76, 30, STEEL, { rx: 12 }), circle(r - 19, 0, 22, STEEL_LIGHT), circle(r - 19, 0, 9, PAINT, { stroke: "none" }));

const measureDisc: Picture = (since) => {
  const taken = stage(since(1), 900, 620, 8);
  const zeroing = since(1) < 0;
  const active = Math.max(0, taken - 1);
  const points = LEFT.map((_, index) => {
    const [px, py] = polar(225, 250, 186, -90 + index * 45);
    return circle(px, py, index === active && !zeroing ? 15 : 10, index < taken ? PAINT : CHALK, { "stroke-width": 2 });
  });
  const rows = LEFT.slice(0, taken).map((value, index) => {
    const marked = since(2) > 800 && (value === "21.87" || value === "21.92");
    const [cx, cy] = [520 + (index % 2) * 124, 136 + Math.floor(index / 2) * 52];
    return (marked ? rect(cx - 9, cy - 36, 120, 48, "none", { stroke: PAINT, "stroke-width": 4 }) : "") + text(cx, cy, value, { size: 34, font: "reading" });
  });
  return (
    discFace(225, 250, 215) +
    points.join("") +
    (zeroing ? "" : micrometerEndOn(225, 250, 205, -90 + between(Math.max(0, active - 1), active, glide(since(1), 900 + active * 620 - 300, 300)) * 45)) +
    panel(500, 40, 270, 268) +
    text(520, 84, "Left front, mm", { size: 32, fill: SOFT }) +
    rows.join("") +
    group({ x: 500, y: 326 }, panel(0, 0, 270, 178), text(20, 44, zeroing ? "Zero" : `Point ${active + 1}`, { size: 32, fill: SOFT }), display(20, 64, 230, zeroing ? "0.00" : (LEFT[active] ?? ""), 62))
  );
};

const leftVerdict: Picture = (since) => {
  const y = (mm: number): number => 440 - (mm - 21.82) * 1800;
  const bars = LEFT.map((value, index) => {
    const mm = Number(value);
    return (
      rect(40 + index * 76, y(mm), 50, 440 - y(mm), mm === 21.87 ? PAINT : STEEL_LIGHT) +
      text(65 + index * 76, 484, value.slice(2), { anchor: "middle", size: 32, font: "reading", fill: mm === 21.87 ? PAINT : CHALK })
    );
  });
  return (
    bars.join("") +
    line(30, y(22), 750, y(22), CHALK, 4, { "stroke-dasharray": "14 10" }) +
    text(750, y(22) - 16, "Limit 22.0 mm", { size: 40, anchor: "end" }) +
    text(30, 44, "Left disc, eight points", { size: 34, fill: SOFT, weight: 500 }) +
    group({ opacity: glide(since(1), 400, 500) }, line(570, y(21.92), 664, y(21.92), PAINT, 4), line(350, y(21.87), 664, y(21.87), PAINT, 4, { "stroke-dasharray": "10 8" }), line(654, y(21.92), 654, y(21.87), PAINT, 4), text(672, (y(21.92) + y(21.87)) / 2 + 14, "0.05", { size: 42, font: "reading", fill: PAINT }))
  );
};

const bothDiscs: Picture = (since) => {
  const verdict = (ms: number): number => glide(ms, 900, 500);
  const column = (x: number, name: string, lowest: string, variation: string, lowBad: boolean, variationBad: boolean): string =>
    discFace(x, 150, 126) +
    text(x, 326, name, { anchor: "middle", size: 42 }) +
    text(x - 20, 392, lowest, { anchor: "end", size: 48, font: "reading", fill: lowBad ? PAINT : CHALK }) +
    text(x + 6, 392, "lowest", { size: 34, fill: SOFT }) +
    text(x - 20, 450, variation, { anchor: "end", size: 48, font: "reading", fill: variationBad ? PAINT : CHALK }) +
    text(x + 6, 450, "variation", { size: 34, fill: SOFT });
  const strike = (x: number, part: number): string => (part > 0 ? line(x - 110, 260, x - 110 + 220 * part, 260 - 220 * part, PAINT, 16) : "");
  return column(200, "Left", "21.87", "0.05", true, true) + column(580, "Right", "22.30", "0.02", false, true) + strike(200, verdict(since(1))) + strike(580, verdict(since(1) - 600)) + line(390, 30, 390, 470, SOFT, 2, { "stroke-dasharray": "12 8" });
};

export const DISCS_LOOK: Record<string, Picture> = {
  "job-card": jobCard,
  limit,
  tools,
  "stop-rules": stopRules,
  pads,
  "measure-disc": measureDisc,
  "left-verdict": leftVerdict,
  "both-discs": bothDiscs,
};
