/** The look's colours, as the films use them. */
export const INK = "#17201E";
export const CHALK = "#FBFAF5";
export const DEEP = "#2B4A43";
export const FIELD = "#203832";
export const HAIRLINE = "#45675E";
export const SOFT = "#BFD0C8";
export const STEEL = "#93A19A";
export const STEEL_LIGHT = "#C9D2CC";
export const STEEL_DARK = "#5C6A64";
export const PAINT = "#F0623A";
export const CAUTION = "#F2B705";
export const RUBBER = "#2A3331";

const PLATE_FONT = "'Barlow Condensed'";
const READING_FONT = "'Atkinson Hyperlegible Mono Variable'";

type Value = string | number | undefined;
export type Style = Record<string, Value>;

const escapeXml = (text: string): string => text.replace(/&/g, "&amp;").replace(/</g, "&lt;").replace(/>/g, "&gt;").replace(/"/g, "&quot;");

/** A coordinate to a tenth of a pixel, so that equal pictures are equal texts. */
export const tenth = (value: number): number => Math.round(value * 10) / 10 + 0;

function attributes(style: Style): string {
  return Object.entries(style)
    .filter((entry): entry is [string, string | number] => entry[1] !== undefined)
    .map(([name, value]) => ` ${name}="${typeof value === "number" ? tenth(value) : escapeXml(value)}"`)
    .join("");
}

/** One element; `children` is SVG already. */
export const element = (name: string, style: Style, children = ""): string =>
  children === "" ? `<${name}${attributes(style)}/>` : `<${name}${attributes(style)}>${children}</${name}>`;

const OUTLINE: Style = { stroke: INK, "stroke-width": 3, "stroke-linejoin": "round", "stroke-linecap": "round" };

export const rect = (x: number, y: number, width: number, height: number, fill: string, style: Style = {}): string =>
  element("rect", { x, y, width, height, fill, rx: 3, ...OUTLINE, ...style });
export const circle = (cx: number, cy: number, r: number, fill: string, style: Style = {}): string =>
  element("circle", { cx, cy, r, fill, ...OUTLINE, ...style });
export const line = (x1: number, y1: number, x2: number, y2: number, stroke = CHALK, width = 3, style: Style = {}): string =>
  element("line", { x1, y1, x2, y2, ...OUTLINE, stroke, "stroke-width": width, ...style });
export const path = (d: string, fill: string, style: Style = {}): string => element("path", { d, fill, ...OUTLINE, ...style });
/** A bare stroke. */
export const stroke = (d: string, colour: string, width: number, style: Style = {}): string =>
  path(d, "none", { stroke: colour, "stroke-width": width, ...style });

type Placed = { x?: number; y?: number; turn?: number; scale?: number; opacity?: number };

/** Moves, turns (degrees, about its own origin), scales and fades what is in it; nothing at all when it can't be seen. */
export function group({ x = 0, y = 0, turn = 0, scale = 1, opacity = 1 }: Placed, ...children: string[]): string {
  if (opacity <= 0.01) return "";
  const parts = [
    x !== 0 || y !== 0 ? `translate(${tenth(x)} ${tenth(y)})` : "",
    turn !== 0 ? `rotate(${tenth(turn)})` : "",
    scale !== 1 ? `scale(${Math.round(scale * 1000) / 1000})` : "",
  ].filter((part) => part !== "");
  const style: Style = { transform: parts.length > 0 ? parts.join(" ") : undefined };
  return element("g", { ...style, opacity: opacity < 0.99 ? Math.round(opacity * 100) / 100 : undefined }, children.join(""));
}

type TextStyle = { size?: number; fill?: string; anchor?: "start" | "middle" | "end"; weight?: number; font?: "plate" | "reading" };

/** Words on a plate (default) or a reading in tabular figures. @param y  the base line */
export const text = (x: number, y: number, words: string, { size = 30, fill = CHALK, anchor = "start", weight = 600, font = "plate" }: TextStyle = {}): string =>
  element(
    "text",
    {
      x,
      y,
      fill,
      "font-size": size,
      "font-weight": weight,
      "font-family": font === "plate" ? PLATE_FONT : READING_FONT,
      "text-anchor": anchor === "start" ? undefined : anchor,
    },
    escapeXml(words),
  );

/** Breaks words into lines of at most `most` characters. */
export function wrap(words: string, most: number): string[] {
  const lines: string[] = [];
  for (const word of words.split(" ")) {
    const last = lines.at(-1);
    if (last !== undefined && `${last} ${word}`.length <= most) lines[lines.length - 1] = `${last} ${word}`;
    else lines.push(word);
  }
  return lines;
}

/** As `wrap`, but with lines of about the same length, so that no word is left alone. */
export function balance(words: string, most: number): string[] {
  const count = wrap(words, most).length;
  let width = most;
  while (width > 8 && wrap(words, width - 1).length === count) width -= 1;
  return wrap(words, width);
}

/** Several lines of text, one under the other. */
export const lines = (x: number, y: number, words: readonly string[], leading: number, style: TextStyle = {}): string =>
  words.map((entry, index) => text(x, y + index * leading, entry, style)).join("");

export const polar = (cx: number, cy: number, r: number, degrees: number): [number, number] => [
  cx + r * Math.cos((degrees * Math.PI) / 180),
  cy + r * Math.sin((degrees * Math.PI) / 180),
];
