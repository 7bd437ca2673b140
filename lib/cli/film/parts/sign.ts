import { CAUTION, circle, group, path, rect, stroke } from "@/lib/cli/film/svg";

const BLACK = "#0B0F0E";
const BLUE = "#1F5E9E";
const WHITE = "#FFFFFF";
const HEAD = "M-34 52 C-34 20 -30 -2 -30 -16 C-30 -58 30 -58 30 -16 L38 4 L28 8 L28 24 C28 34 12 34 6 34 L6 52 Z";

/** What each sign shows, in our own drawing after the meaning of its ISO 7010 id. */
const PICTOGRAMS: Record<string, () => string> = {
  W001: () => path("M-8 -44 L8 -44 L5 18 L-5 18 Z", BLACK, { stroke: "none" }) + circle(0, 36, 9, BLACK, { stroke: "none" }),
  // Something comes down on someone.
  W019: () =>
    rect(-40, -34, 80, 22, BLACK, { stroke: "none" }) +
    path("M-12 -8 L12 -8 L0 8 Z", BLACK, { stroke: "none" }) +
    circle(-44, 38, 9, BLACK, { stroke: "none" }) +
    stroke("M-34 40 L26 40 L50 44", BLACK, 13) +
    rect(-58, 52, 116, 6, BLACK, { stroke: "none" }),
  // A hand between two rollers or plates.
  W024: () =>
    rect(-46, -22, 92, 13, BLACK, { stroke: "none" }) +
    rect(-52, 46, 104, 12, BLACK, { stroke: "none" }) +
    rect(8, -5, 46, 42, BLACK, { stroke: "none", rx: 10 }) +
    [-30, -42, -40, -28].map((x, index) => rect(x, -5 + index * 10.5, 44 - x - 10, 8, BLACK, { stroke: "none", rx: 4 })).join("") +
    stroke("M34 36 L4 41", BLACK, 8),
  M004: () =>
    path(HEAD, WHITE, { stroke: "none" }) + path("M-6 -26 L34 -26 L34 -6 L4 -6 C-4 -6 -6 -14 -6 -26 Z", BLUE, { stroke: WHITE, "stroke-width": 4 }) + stroke("M-6 -18 L-30 -22", BLUE, 6),
  M016: () => path(HEAD, WHITE, { stroke: "none" }) + path("M8 4 L44 2 L40 30 L10 34 C4 24 4 14 8 4 Z", BLUE, { stroke: WHITE, "stroke-width": 4 }) + stroke("M8 8 L-30 -8 M10 28 L-32 26", BLUE, 5),
};

/** A safety sign, 220 high; its origin is its middle. @throws Error for a sign that no drawing exists for */
export function sign(x: number, y: number, id: string, scale = 1): string {
  const pictogram = PICTOGRAMS[id];
  if (!pictogram) throw new Error(`The films have no drawing for the sign ${id}.`);
  const warns = id.startsWith("W");
  return group(
    { x, y, scale },
    warns ? path("M0 -108 L124 104 L-124 104 Z", CAUTION, { stroke: BLACK, "stroke-width": 16 }) : circle(0, 0, 108, BLUE, { stroke: WHITE, "stroke-width": 8 }),
    group(warns ? { y: 26, scale: 0.98 } : { scale: 1.35 }, pictogram()),
  );
}
