import type { Plate, Scene, StepScript } from "@/db/seeds/demo/films/types";
import { glide, type Since } from "@/lib/cli/film/moment";
import { boltHead } from "@/lib/cli/film/parts/bolt-head";
import { sign } from "@/lib/cli/film/parts/sign";
import { PICTURES } from "@/lib/cli/film/pictures";
import { balance, CAUTION, CHALK, DEEP, element, FIELD, group, HAIRLINE, INK, line, lines, PAINT, rect, SOFT, stroke, text } from "@/lib/cli/film/svg";

export const WIDTH = 1280;
export const HEIGHT = 720;
const NOTICE = "Invented demonstration values. Never use on a real vehicle; the maker's data rules.";

export type FrameOf = {
  film: { vehicle: string };
  step: StepScript;
  stepNumber: number;
  scene: Scene;
  since: Since;
  /** How much of the film lies before this scene, 0 to 1: as far as the paint line has got. */
  doneShare: number;
};

/** One frame of a film, as SVG. Frames with the same text look the same, so each is drawn only once. */
export function frame(of: FrameOf): string {
  const body = of.scene.caution ? cautionPage(of) : picturePage(of);
  return element(
    "svg",
    { xmlns: "http://www.w3.org/2000/svg", viewBox: `0 0 ${WIDTH} ${HEIGHT}`, width: WIDTH, height: HEIGHT },
    rect(0, 0, WIDTH, HEIGHT, DEEP, { stroke: "none", rx: 0 }) + head(of) + body + text(40, 698, NOTICE, { size: 26, fill: SOFT, weight: 500 }),
  );
}

function head({ film, step, stepNumber, doneShare }: FrameOf): string {
  const reached = 112 + (WIDTH - 40 - 112) * doneShare;
  return (
    line(112, 106, WIDTH - 40, 106, HAIRLINE, 3) +
    boltHead(72, 62, 34, { fill: INK }) +
    stroke(`M84 74 L112 106 L${Math.round(reached)} 106`, PAINT, 8) +
    text(72, 77, String(stepNumber), { size: 42, anchor: "middle", weight: 700 }) +
    text(128, 80, step.title, { size: 54 }) +
    text(WIDTH - 40, 78, film.vehicle, { size: 32, anchor: "end", fill: SOFT, weight: 500 })
  );
}

function picturePage({ scene, since }: FrameOf): string {
  const picture = PICTURES[scene.picture];
  if (!picture) throw new Error(`There is no picture “${scene.picture}”.`);
  const plates = scene.lines.flatMap((entry, index) => (entry.plates ?? []).map((plate, place) => ({ plate, ms: since(index) - 250 - place * 350 })));
  // Without a plate in the whole scene, the picture has the middle of the page to itself.
  const alone = plates.length === 0;
  return rect(40, 128, alone ? WIDTH - 80 : 800, 536, FIELD, { stroke: HAIRLINE, "stroke-width": 2 }) + group({ x: alone ? 250 : 50, y: 136 }, picture(since)) + plateColumn(plates);
}

function plateColumn(plates: { plate: Plate; ms: number }[]): string {
  let y = 128;
  return plates
    .map(({ plate, ms }) => {
      const shown = glide(ms, 0, 400);
      const top = y;
      const { height, body } = plate.kind === "value" ? valuePlate(plate) : notePlate(plate);
      y += height + 16;
      return group({ x: 864 + (1 - shown) * 40, y: top, opacity: shown }, body);
    })
    .join("");
}

function valuePlate({ label, value, unit, note }: Extract<Plate, { kind: "value" }>): { height: number; body: string } {
  const height = note === undefined ? 148 : 184;
  // A letter of the reading face is 0.6 of its size wide; figures and unit share the plate's width.
  const size = Math.min(84, Math.floor((314 - unit.length * 26.4) / (value.length * 0.6)));
  const figures = element(
    "text",
    { x: 24, y: 122, fill: INK, "font-size": size, "font-family": "'Atkinson Hyperlegible Mono Variable'", "font-weight": 600 },
    `${value}<tspan font-size="44" dx="14" font-weight="500">${unit}</tspan>`,
  );
  return {
    height,
    body: rect(0, 0, 376, height, CHALK) + text(24, 44, label, { size: 34, fill: INK }) + figures + (note === undefined ? "" : text(24, 166, note, { size: 30, fill: "#4A5753", weight: 500 })),
  };
}

function notePlate({ text: words }: Extract<Plate, { kind: "note" }>): { height: number; body: string } {
  const broken = balance(words, 21);
  const height = 34 + broken.length * 42;
  return {
    height,
    body: rect(0, 0, 376, height, FIELD, { stroke: HAIRLINE, "stroke-width": 2 }) + rect(0, 0, 10, height, PAINT, { stroke: "none", rx: 0 }) + lines(32, 54, broken, 42, { size: 40 }),
  };
}

/** A caution fills the page, before the step that needs it. */
function cautionPage({ scene }: FrameOf): string {
  const caution = scene.caution;
  if (!caution) return "";
  const hazard = balance(caution.hazard, 36);
  const todo = balance(caution.instruction.replace(/ The maker's data and local rules come first\.$/, ""), 38);
  const top = 236;
  const middle = top + hazard.length * 62 + 14;
  return (
    rect(40, 128, WIDTH - 80, 536, CAUTION) +
    rect(40, 128, 330, 536, CHALK) +
    sign(205, 388, caution.sign, 1.12) +
    text(410, 190, caution.grade.toUpperCase(), { size: 40, fill: INK, weight: 700 }) +
    lines(410, top + 24, hazard, 62, { size: 58, fill: INK, weight: 700 }) +
    line(410, middle, WIDTH - 76, middle, INK, 4) +
    lines(410, middle + 64, todo, 58, { size: 50, fill: INK, weight: 600 }) +
    text(410, 636, "The maker's data and local rules come first.", { size: 34, fill: INK, weight: 500 })
  );
}
