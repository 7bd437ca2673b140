import { between, glide, stage, type Picture } from "@/lib/cli/film/moment";
import { arrow, dimension } from "@/lib/cli/film/parts/annotations";
import { BELT_RUBBER, beltPath, PIVOT, PULLEYS, pulleyFace, routing, run, strap, type Pulley } from "@/lib/cli/film/parts/belt";
import { boltHead } from "@/lib/cli/film/parts/bolt-head";
import { handMeter, torqueWrench } from "@/lib/cli/film/parts/instruments";
import { recap } from "@/lib/cli/film/pictures/discs-fit";
import { CHALK, circle, group, INK, line, PAINT, path, polar, rect, RUBBER, SOFT, STEEL, STEEL_DARK, STEEL_LIGHT, stroke, tenth, text } from "@/lib/cli/film/svg";

const named = (name: string): Pulley => PULLEYS.find((pulley) => pulley.name === name) as Pulley;
const IDLER = named("Idler");

/** The engine's front with the tensioner turned away by `part`, 0 to 1. */
const relieved = (part: number): Pulley[] => PULLEYS.map((pulley) => (pulley.name === "Tensioner" ? { ...pulley, x: pulley.x - 34 * part, y: pulley.y + 8 * part } : pulley));

const concern: Picture = (since) => {
  const squeal = since(1) > 300 && since(1) < 2600;
  const flicker = since(1) > 2200 && Math.floor(since(1) / 300) % 2 === 0;
  return (
    group({ x: 0, y: 90, scale: 0.74 }, routing({})) +
    (squeal ? stroke("M178 150 l30 -18 M186 176 l36 -2 M166 128 l18 -30", PAINT, 8) : "") +
    group(
      { x: 640, y: 150 },
      rect(-96, -100, 192, 160, INK, { rx: 10 }),
      path("M-52 -36 L52 -36 L52 34 L-52 34 Z M-36 -50 h22 v14 h-22 Z M14 -50 h22 v14 h-22 Z", flicker || since(1) > 4000 ? PAINT : STEEL_DARK),
      text(-26, 12, "−", { size: 44, anchor: "middle", fill: INK }),
      text(28, 12, "+", { size: 44, anchor: "middle", fill: INK }),
    ) +
    group({ opacity: glide(since(1), 4300, 500) }, text(640, 320, "P0562", { size: 68, anchor: "middle", font: "reading", fill: PAINT }))
  );
};

const battery = (x: number, y: number): string =>
  group({ x, y }, rect(0, 0, 330, 210, RUBBER), rect(0, 0, 330, 54, STEEL_DARK), rect(48, -30, 50, 32, STEEL), rect(232, -30, 50, 32, STEEL), text(72, 44, "−", { size: 50, anchor: "middle" }), text(258, 44, "+", { size: 50, anchor: "middle" }), text(165, 150, "12 V", { size: 64, anchor: "middle", font: "reading", fill: SOFT }));

const charge =
  (before: string, reading: string, good: boolean): Picture =>
  (since) => {
    const shown = since(0) > 1400;
    const y = (volts: number): number => 240 - (volts - 12.6) * 80;
    const at = Number(reading);
    return (
      battery(300, 316) +
      handMeter(20, 24, shown ? reading : before, "V", "MM-1", [[372, 286], [558, 286]]) +
      rect(600, y(14.8), 60, y(13.8) - y(14.8), STEEL_LIGHT) +
      line(630, 56, 630, 252, CHALK, 4) +
      text(680, y(14.8) + 12, "14.8", { size: 40, font: "reading" }) +
      text(680, y(13.8) + 12, "13.8", { size: 40, font: "reading" }) +
      group({ opacity: glide(since(0), 1400, 500) }, arrow(520, y(at), 596, y(at)), text(506, y(at) + 14, reading, { size: 44, anchor: "end", font: "reading", fill: good ? CHALK : PAINT })) +
      text(630, 290, "Charging, V", { anchor: "middle", size: 36 })
    );
  };

/** A piece of belt with six ribs, seen on its ribs; its upper left corner is its origin. */
const strip = (y: number, extra: string, name: string, fill = RUBBER): string =>
  group({ x: 30, y }, rect(0, 0, 520, 96, fill), ...[1, 2, 3, 4, 5].map((rib) => line(0, rib * 16, 520, rib * 16, INK, 3)), extra, text(548, 62, name, { size: 42 }));

const beltFaults: Picture = (since) => {
  const cracks = [150, 196, 238].map((x) => stroke(`M${x} 2 l8 22 l-10 24 l8 24 l-6 22`, PAINT, 5)).join("");
  const shown = stage(since(1), 200, 2200, 3);
  const turning = (Math.max(0, since(0)) / 12) % 60;
  if (since(1) < 0) {
    return group({ x: 60, y: 170 }, rect(0, 0, 660, 150, RUBBER), ...[1, 2, 3, 4, 5].map((rib) => line(0, rib * 25, 660, rib * 25, INK, 4)), ...Array.from({ length: 11 }, (_, index) => line(index * 60 + turning, 0, index * 60 + turning, 8, SOFT, 3))) + arrow(300, 380, 480, 380) + text(390, 120, "Six ribs, under the lamp", { anchor: "middle", size: 42 });
  }
  return (
    (shown > 0 ? strip(70, cracks + dimension(124, 266, -10, ""), "Cracks") + text(225, 40, "25 mm", { anchor: "middle", size: 34, font: "reading" }) : "") +
    (shown > 1 ? strip(230, path("M120 30 C180 -10 300 10 340 44 C380 90 240 92 180 78 C130 70 100 50 120 30 Z", "#8A6A2E", { opacity: "0.85" }), "Oil") : "") +
    (shown > 2 ? strip(390, [0, 1, 2, 3].map((index) => line(30 + index * 124, 88, 100 + index * 124, 8, CHALK, 7, { opacity: "0.55" })).join(""), "Glaze", "#4E5C59") : "")
  );
};

const keyBox: Picture = (since) => {
  const inside = glide(since(0), 300, 1500);
  const shut = glide(since(0), 2000, 700);
  const key = (x: number, y: number, turn: number): string =>
    group({ x, y, turn }, circle(0, 0, 44, STEEL_DARK), circle(-14, 0, 12, INK), rect(40, -12, 110, 24, STEEL_LIGHT), path("M96 12 l0 16 l14 0 l0 -16 M124 12 l0 22 l14 0 l0 -22", STEEL_LIGHT));
  return (
    rect(240, 100, 300, 300, STEEL_DARK) +
    rect(260, 120, 260, 260, INK) +
    key(between(70, 330, inside), between(120, 200, inside), 20 * inside) +
    group({ x: between(40, 310, inside), y: between(330, 280, inside) }, rect(0, 0, 130, 70, RUBBER, { rx: 24 }), circle(36, 34, 12, STEEL), circle(78, 34, 12, STEEL)) +
    group({ x: 240, y: 100, opacity: shut }, rect(0, 0, 300, 300, STEEL), rect(18, 18, 264, 264, "none", { "stroke-width": 2 }), circle(250, 150, 26, STEEL_DARK), text(130, 160, "Keys", { anchor: "middle", size: 54, fill: INK })) +
    (since(0) > 3200 ? group({ x: 500, y: 300 }, stroke("M-34 0 V-40 a34 34 0 0 1 68 0 V0", CHALK, 14), rect(-56, 0, 112, 90, PAINT), circle(0, 36, 12, INK), rect(-5, 40, 10, 30, INK)) : "")
  );
};

const routingDrawn: Picture = (since) => {
  const names = stage(since(0), 2600, 780, 6);
  const ribs = since(1) > 300;
  return (
    routing({ drawn: glide(since(0), 2600, 5200), labels: ribs ? 0 : names, colour: PAINT }) +
    (ribs ? PULLEYS.map(({ x, y, r, side }) => circle(x, y, r - 3, "none", { stroke: side === 1 ? CHALK : PAINT, "stroke-width": 6, "stroke-dasharray": side === 1 ? "4 6" : undefined })).join("") + text(20, 44, "Ribs on grooves", { size: 38 }) + text(20, 510, "Back on smooth", { size: 38, fill: PAINT }) : "")
  );
};

const bar = (x: number, y: number, turn: number): string => group({ x, y, turn }, rect(0, -11, 200, 22, STEEL_LIGHT), circle(0, 0, 20, STEEL_DARK), rect(150, -15, 76, 30, STEEL_DARK, { rx: 14 }));

/** The tensioner's pin with its ring, its point at (x, y). */
const lockPin = (x: number, y: number): string => group({ x, y }, rect(-66, -7, 84, 14, PAINT), circle(-78, 0, 18, "none", { stroke: PAINT, "stroke-width": 8 }));

const relieve: Picture = (since) => {
  const part = glide(since(0), 900, 2000) - 0.12 * glide(since(1), 3000, 700);
  const pinned = glide(since(1), 1000, 900);
  const pulleys = relieved(part);
  const { x, y } = pulleys[1] as Pulley;
  return (
    routing({ pulleys }) +
    bar(x, y, 64 + 34 * part) +
    (part > 0.05 && part < 0.95 && pinned === 0 ? arrow(300, 500, 216, 512) : "") +
    (pinned > 0 ? lockPin(between(-20, PIVOT[0], pinned), PIVOT[1]) : "") +
    text(20, 60, pinned > 0.95 ? "Pinned" : part > 0.9 ? "Slack" : "", { size: 48, fill: PAINT })
  );
};

const beltOff: Picture = (since) => {
  const off = glide(since(0), 500, 1600);
  const loop = (x: number, ribs: string): string => stroke(`M${x} 120 a52 52 0 0 1 104 0 V400 a52 52 0 0 1 -104 0 Z`, INK, 26) + stroke(`M${x} 120 a52 52 0 0 1 104 0 V400 a52 52 0 0 1 -104 0 Z`, ribs, 19);
  return (
    group({ x: -40, y: 60, scale: 0.74 }, routing({ pulleys: relieved(0.88), belt: false }), group({ x: off * 60, y: -off * 26, opacity: 1 - off }, strap(beltPath(relieved(0.88), 5)))) +
    group({ opacity: glide(since(0), 2400, 600) }, loop(510, BELT_RUBBER), loop(650, STEEL_LIGHT), text(562, 505, "Old", { anchor: "middle", size: 40 }), text(702, 505, "New", { anchor: "middle", size: 40 }), line(480, 66, 776, 66, PAINT, 3, { "stroke-dasharray": "10 8" }), line(480, 454, 776, 454, PAINT, 3, { "stroke-dasharray": "10 8" }))
  );
};

const idler: Picture = (since) => {
  const turn = 720 * glide(since(0), 300, 3200);
  const rock = since(0) > 3600 && since(0) < 5400 ? 5 * Math.sin(since(0) / 110) : 0;
  return (
    group({ x: 250 + rock, y: 260 }, pulleyFace({ ...IDLER, x: 0, y: 0, r: 180 }, turn)) +
    group({ x: 600, y: 260 }, rect(-70, -150, 140, 300, STEEL_LIGHT), rect(-70, -96, 140, 34, INK), rect(-70, 62, 140, 34, INK), ...[-79, 79].map((y) => circle(-24, y, 15, STEEL) + circle(24, y, 15, STEEL)), line(-120, 0, 120, 0, CHALK, 2, { "stroke-dasharray": "30 8 6 8" })) +
    text(250, 502, rock !== 0 ? "Rock it" : since(0) > 5400 ? "" : "Spin it", { anchor: "middle", size: 44 }) +
    text(600, 470, "Bearing", { anchor: "middle", size: 38 })
  );
};

const alignment: Picture = (since) => {
  const laid = glide(since(0), 300, 1200);
  const shown = glide(since(0), 5200, 500);
  const side = (x: number, y: number, height: number): string => rect(x, y - height / 2, 70, height, STEEL) + Array.from({ length: 5 }, (_, index) => line(x + 14 + index * 11, y - height / 2 + 8, x + 14 + index * 11, y + height / 2 - 8, INK, 3)).join("") + rect(x + 70, y - 22, 60, 44, STEEL_DARK);
  return (
    side(420, 110, 130) +
    side(432, 270, 90) +
    side(420, 424, 150) +
    rect(between(120, 386, laid), 20, 34, 490, STEEL_LIGHT) +
    text(190, 100, "Straight edge", { anchor: "middle", size: 38 }) +
    line(290, 90, 382, 90, CHALK, 3) +
    group({ opacity: shown }, arrow(574, 196, 430, 250, PAINT, 5), text(586, 202, "0.4 mm", { size: 48, font: "reading", fill: PAINT }))
  );
};

/** A pull on the wrench, and the small give of its click. */
const turnOf = (ms: number, fromMs: number): number => 14 - 20 * glide(ms, fromMs, 1200) + 3 * glide(ms, fromMs + 1250, 120);

const tensionerTorque: Picture = (since) => {
  const second = since(0) > 5200;
  return (
    group({ x: 190, y: 220 }, path("M-40 -40 L126 -140 L160 -84 L40 60 Z", STEEL_DARK), circle(130, -100, 60, STEEL_LIGHT), circle(130, -100, 20, STEEL_DARK), circle(0, 0, 84, STEEL), circle(-52, 30, 11, PAINT), boltHead(0, 0, 26, { fill: second ? PAINT : CHALK })) +
    group({ x: 190, y: 424 }, pulleyFace({ ...IDLER, x: 0, y: 0, r: 76 }), boltHead(0, 0, 22, { fill: since(0) > 6900 ? PAINT : CHALK })) +
    (second ? torqueWrench(190, 424, "40", turnOf(since(0), 5600)) : torqueWrench(190, 220, "45", turnOf(since(0), 2200))) +
    line(128, 252, 90, 300, PAINT, 3) +
    text(20, 334, "Peg", { size: 38, fill: PAINT })
  );
};

const beltOn: Picture = (since) => {
  const on = glide(since(0), 500, 2600);
  const up = glide(since(0), 5000, 2200);
  const pulleys = relieved(0.9 * (1 - up));
  const { x, y } = pulleys[1] as Pulley;
  return (
    routing({ pulleys, belt: up > 0 || on >= 1, ...(on < 1 ? { drawn: on, colour: CHALK } : {}) }) +
    (since(0) > 4200 ? bar(x, y, 64 + 34 * (1 - up)) : "") +
    group({ opacity: 1 - glide(since(0), 4700, 400) }, lockPin(between(PIVOT[0], 86, glide(since(0), 4600, 500)), PIVOT[1])) +
    text(IDLER.x, 136, "Idler last", { anchor: "middle", size: 34 })
  );
};

const section = (x: number, shift: number, name: string, wrong: boolean): string => {
  const grooves = Array.from({ length: 6 }, () => "l22 56 l22 -56").join(" ");
  return group(
    { x, y: 150 },
    path(`M-14 20 l14 0 ${grooves} l14 0 L278 200 L-14 200 Z`, STEEL),
    path(`M${-2 + shift} -34 L${266 + shift} -34 L${266 + shift} 14 ${Array.from({ length: 6 }, () => "l-22 54 l-22 -54").join(" ")} Z`, wrong ? "#A65A42" : BELT_RUBBER),
    text(132, 270, name, { anchor: "middle", size: 42, fill: wrong ? PAINT : CHALK }),
    wrong ? stroke("M40 -96 L224 230", PAINT, 14) : "",
  );
};

const oneRibOff: Picture = (since) => group({ x: 70, y: 40 }, section(0, 0, "Seated", false), group({ opacity: glide(since(0), 1600, 500) }, section(360, 44, "One rib off", since(0) > 3000)));

const secondTurn: Picture = (since) => {
  const turn = 720 * glide(since(0), 600, 4200);
  const [x, y] = polar(330, 396, 46, turn - 90);
  return routing({ turn }) + group({ x: 330, y: 396, turn: turn + 20 }, rect(0, -10, 230, 20, STEEL_LIGHT), circle(0, 0, 22, STEEL_DARK)) + circle(x, y, 12, PAINT) + text(20, 60, `Turn ${turn >= 719 ? 2 : Math.floor(turn / 360) + 1} of 2`, { size: 48 });
};

const frequency: Picture = (since) => {
  const pluck = since(0) > 2600 && since(0) < 5200 ? Math.sin(since(0) / 45) * 18 * (1 - (since(0) - 2600) / 2600) : 0;
  const shown = since(0) > 4300;
  const low: Pulley = { ...IDLER, x: 110, y: 340, r: 80, side: 1 };
  const high: Pulley = { ...IDLER, x: 380, y: 130, r: 62, side: 1 };
  const [x1, y1, x2, y2] = run(low, high);
  const [bx1, by1, bx2, by2] = run(high, low);
  return (
    pulleyFace(low) +
    pulleyFace(high) +
    strap(`M${tenth(bx1)} ${tenth(by1)} L${tenth(bx2)} ${tenth(by2)}`) +
    strap(`M${tenth(x1)} ${tenth(y1)} Q${tenth((x1 + x2) / 2 + pluck)} ${tenth((y1 + y2) / 2 + pluck)} ${tenth(x2)} ${tenth(y2)}`) +
    handMeter(500, 150, shown ? "128" : "---", "Hz", "Belt frequency") +
    stroke("M620 150 C600 20 330 10 210 130", INK, 6) +
    group({ x: 204, y: 138, turn: 46 }, rect(-24, -14, 52, 28, STEEL_LIGHT)) +
    group({ x: 330, y: 420 }, rect(-90, -30, 260, 60, STEEL_DARK), rect(0, -30, 80, 60, CHALK), path("M40 -44 l-14 -26 l28 0 Z", PAINT), text(40, 66, "pointer in window", { anchor: "middle", size: 34 }))
  );
};

export const BELT: Record<string, Picture> = {
  "belt-concern": concern,
  "charge-low": charge("0.0", "13.1", false),
  "belt-faults": beltFaults,
  "key-box": keyBox,
  routing: routingDrawn,
  relieve,
  "belt-off": beltOff,
  idler,
  alignment,
  "tensioner-torque": tensionerTorque,
  "belt-on": beltOn,
  "one-rib-off": oneRibOff,
  "second-turn": secondTurn,
  frequency,
  "charge-good": charge("0.0", "14.2", true),
  "recap-belt": recap(["Key and fob locked away", "Path drawn, tensioner pinned", "Two turns by hand", "A number for tension and charge"]),
};
