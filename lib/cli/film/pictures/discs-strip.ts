import { between, glide, stage, type Picture } from "@/lib/cli/film/moment";
import { arrow } from "@/lib/cli/film/parts/annotations";
import { calliper, carrier, pistonBore, reservoir } from "@/lib/cli/film/parts/calliper";
import { car } from "@/lib/cli/film/parts/car";
import { discFace, pad } from "@/lib/cli/film/parts/disc";
import { liftArms, liftLock, liftPost } from "@/lib/cli/film/parts/lift";
import { boltAngle, wheel } from "@/lib/cli/film/parts/wheel";
import { CHALK, circle, group, INK, line, PAINT, path, polar, rect, RUBBER, STEEL, STEEL_DARK, STEEL_LIGHT, stroke, tenth, text } from "@/lib/cli/film/svg";

const crackBolts: Picture = (since) => {
  const each = 800;
  const done = stage(since(0), 800 + each, each, 5);
  const active = Math.min(4, done);
  const turn = 90 * glide(since(0), 800 + active * each, each);
  const turns = [0, 1, 2, 3, 4].map((index) => (index < done ? -30 : index === active ? -turn / 3 : 0));
  const [bx, by] = polar(340, 262, 240 * 0.24, boltAngle(active));
  return (
    line(20, 503, 760, 503, STEEL, 6) +
    wheel(340, 262, 240, { turns, fills: [0, 1, 2, 3, 4].map((index) => (index < done ? PAINT : STEEL_LIGHT)) }) +
    (done < 5 ? group({ x: bx, y: by, turn: -20 - turn }, rect(0, -11, 330, 22, STEEL_LIGHT), circle(0, 0, 25, STEEL_DARK)) : "") +
    text(770, 496, "on the ground", { anchor: "end", size: 34 })
  );
};

const lift: Picture = (since) => {
  const first = glide(since(1), 400, 1200);
  const high = glide(since(2), 300, 1600);
  const settle = glide(since(2), 2300, 500);
  const height = between(0, 34, first) + between(0, 176, high) - settle * 8;
  const pushing = since(1) > 2200 && since(1) < 4200 ? 4 * Math.sin(since(1) / 90) : 0;
  const ground = 476;
  const body = ground - height;
  const pads = body - 44;
  const setting = glide(since(0), 500, 1200);
  return (
    liftPost(390, 10, ground) +
    line(20, ground + 8, 760, ground + 8, STEEL, 6) +
    liftArms(390, pads, between(70, 132, setting), setting > 0.95 ? PAINT : STEEL_LIGHT) +
    car(228 + pushing, body, { scale: 1.25 }) +
    (high > 0.9 ? liftLock(374, 386, high > 0.99 ? settle : 0) : "") +
    (first > 0.95 && high < 0.02 ? arrow(30, body - 140, 112, body - 140) + arrow(752, body - 140, 668, body - 140) : "") +
    (first > 0.95 && high < 0.02
      ? line(700, ground, 760, ground, CHALK, 3) + line(700, body, 760, body, CHALK, 3) + text(690, ground - 6, "100", { size: 40, font: "reading", anchor: "end", fill: PAINT })
      : "") +
    (settle > 0.95 ? text(484, 400, "Locked", { size: 48, fill: PAINT }) : "")
  );
};

const wheelOff: Picture = (since) => {
  const away = glide(since(0), 500, 1500);
  return (
    line(-180, 490, 960, 490, STEEL, 6) +
    discFace(200, 236, 160) +
    group({ x: 318, y: 236, turn: 0 }, calliper(0, 0, { scale: 1.1 })) +
    group({ x: between(200, 590, away), y: between(236, 438, away) }, element3d(between(1, 0.32, away)))
  );
};

/** The wheel, tipped from standing (1) towards lying face up. */
const element3d = (upright: number): string => `<g transform="scale(1 ${Math.round(upright * 1000) / 1000})">${wheel(0, 0, 168)}</g>`;

const piston: Picture = (since) => {
  const cap = glide(since(0), 300, 700);
  const pushed = glide(since(0), 2200, 3400);
  return (
    reservoir(60, 84, between(0.42, 0.86, pushed), cap) +
    stroke("M132 264 C132 330 160 330 230 330", INK, 22) +
    stroke("M132 264 C132 330 160 330 230 330", "#B98A2E", 12) +
    pistonBore(230, 330, pushed) +
    arrow(660, 330, 590 - 96 * pushed + 6, 330) +
    text(250, 124, "MAX", { size: 36, fill: pushed > 0.9 ? PAINT : CHALK }) +
    line(106, 112, 240, 112, pushed > 0.9 ? PAINT : CHALK, 2) +
    text(580, 296, "slowly", { size: 38 })
  );
};

const hook: Picture = (since) => {
  const lifted = glide(since(0), 900, 1300);
  const [cx, cy] = [between(380, 560, lifted), between(270, 330, lifted)];
  const coil = Array.from({ length: 6 }, (_, index) => `M500 ${20 + index * 30} q60 18 120 0`).join(" ");
  return (
    discFace(220, 280, 190) +
    carrier(372, 280, 1.1) +
    stroke(coil, STEEL_DARK, 16) +
    rect(540, 0, 40, 210, STEEL) +
    stroke(`M560 ${tenth(cy - 96)} L560 190 q0 -20 18 -20`, PAINT, lifted > 0.95 ? 8 : 0.01) +
    stroke(`M${tenth(cx + 20)} ${tenth(cy + 60)} C${tenth(cx + 130)} ${tenth(cy + 170)} 740 ${tenth(420 - 60 * lifted)} 740 160`, INK, 22) +
    stroke(`M${tenth(cx + 20)} ${tenth(cy + 60)} C${tenth(cx + 130)} ${tenth(cy + 170)} 740 ${tenth(420 - 60 * lifted)} 740 160`, STEEL_DARK, 15) +
    calliper(cx, cy) +
    (lifted > 0.95 ? text(772, 500, "hose hangs slack", { anchor: "end", size: 36 }) : "")
  );
};

const slidePin: Picture = (since) => {
  const move = since(0) > 2800 ? Math.sin((since(0) - 2800) / 500) * 46 : 0;
  const pin = (y: number, by: number, stiff: boolean): string =>
    rect(60, y - 58, 250, 116, STEEL_DARK) +
    rect(120, y - 22, 190, 44, INK, { stroke: "none" }) +
    group({ x: by }, rect(150, y - 19, 330, 38, stiff ? "#A4795A" : STEEL_LIGHT), rect(480, y - 34, 44, 68, STEEL), stiff ? [200, 244, 300, 352, 400].map((x, index) => circle(x, y - 6 + (index % 3) * 6, 6, "#5B3B24", { stroke: "none" })).join("") : "") +
    [0, 1, 2].map((index) => rect(312 + index * 24 + by / 3, y - 30, 16, 60, RUBBER, { rx: 8 })).join("");
  return (
    pin(130, move, false) +
    pin(370, 0, true) +
    text(60, 44, "Upper pin: moves by hand", { size: 38 }) +
    text(60, 286, "Lower pin: stiff, pitted", { size: 38, fill: PAINT }) +
    (move !== 0 ? arrow(560 + 60, 130, 560 + 130, 130, CHALK) + arrow(560 + 60, 130, 560 - 10, 130, CHALK) : "") +
    stroke("M570 340 L630 400 M630 340 L570 400", PAINT, 12)
  );
};

const stripOrder: Picture = (since) => {
  const out = (index: number): number => glide(since(0), 700 + index * 1250, 900);
  const number = (x: number, y: number, index: number, words: string): string =>
    group({ opacity: out(index) }, circle(x, y, 26, PAINT, { stroke: "none" }), text(x, y + 13, String(index + 1), { size: 38, anchor: "middle", weight: 700, fill: INK }), text(x, y + 66, words, { size: 34, anchor: "middle" }));
  return (
    line(20, 240, 760, 240, STEEL_DARK, 2, { "stroke-dasharray": "30 8 6 8" }) +
    rect(20, 190, 60, 100, STEEL_DARK) +
    rect(80, 150, 24, 180, STEEL) +
    group({ x: between(0, 60, out(3)) }, rect(118, 60, 46, 360, STEEL_LIGHT), rect(164, 150, 34, 180, STEEL_LIGHT)) +
    group({ x: between(0, 110, out(2)) }, rect(212, 228, 60, 24, STEEL), path("M272 222 l24 -6 l0 48 l-24 -6 Z", STEEL_DARK)) +
    group({ x: between(60, 190, out(1)) }, group({ x: 276, y: 240, scale: 0.9 }, carrier(0, 0, 1.1)), [-92, 92].map((dy) => rect(298, 240 + dy * 0.98 - 14, 58, 26, STEEL_LIGHT)).join("")) +
    group({ x: between(120, 260, out(0)) }, pad(330, 240, 200, 40, 1), pad(450, 240, 200, 40, -1)) +
    number(650, 400, 0, "Pads") +
    number(486, 400, 1, "Carrier bolts") +
    number(350, 330, 2, "Disc screw") +
    number(206, 446, 3, "Disc")
  );
};

export const DISCS_STRIP: Record<string, Picture> = {
  "crack-bolts": crackBolts,
  lift,
  "wheel-off": wheelOff,
  piston,
  hook,
  "slide-pin": slidePin,
  "strip-order": stripOrder,
};
