import { readFileSync } from "node:fs";
import { createRequire } from "node:module";
import { join } from "node:path";
import { chromium, type Page } from "@playwright/test";
import { frame, HEIGHT, WIDTH } from "@/lib/cli/film/frame";
import type { PlacedScene } from "@/lib/cli/film/timeline";
import { findProgram } from "../programs.mjs";

/** Drawn scenes need no more. */
export const FRAMES_PER_SECOND = 8;

/** One picture and how long it stands, in frames. */
export type Drawn = { svg: string; frames: number };

/** Every frame of the film as SVG text; frames that look the same are one. */
export function framesOf(vehicle: string, scenes: readonly PlacedScene[], durationMs: number): Drawn[] {
  const drawn: Drawn[] = [];
  const total = Math.round((durationMs / 1000) * FRAMES_PER_SECOND);
  for (let index = 0; index < total; index += 1) {
    const at = (index * 1000) / FRAMES_PER_SECOND;
    const placed = scenes.find((candidate) => at < candidate.endMs) ?? scenes.at(-1);
    if (!placed) throw new Error("A film has at least one scene.");
    const svg = frame({
      film: { vehicle },
      step: placed.step,
      stepNumber: placed.stepNumber,
      scene: placed.scene,
      since: (line) => at - (placed.lineStartMs[line] ?? placed.endMs),
      doneShare: placed.startMs / durationMs,
    });
    const last = drawn.at(-1);
    if (last?.svg === svg) last.frames += 1;
    else drawn.push({ svg, frames: 1 });
  }
  return drawn;
}

const resolve = createRequire(join(process.cwd(), "package.json")).resolve;
const font = (family: string, file: string, weight: string): string =>
  `@font-face{font-family:"${family}";font-weight:${weight};src:url(data:font/woff2;base64,${readFileSync(resolve(file)).toString("base64")})}`;

/** The product's own fonts, so that films and pages look alike. */
const fontFaces = (): string =>
  [
    font("Barlow Condensed", "@fontsource/barlow-condensed/files/barlow-condensed-latin-500-normal.woff2", "500"),
    font("Barlow Condensed", "@fontsource/barlow-condensed/files/barlow-condensed-latin-600-normal.woff2", "600"),
    font("Atkinson Hyperlegible Mono Variable", "@fontsource-variable/atkinson-hyperlegible-mono/files/atkinson-hyperlegible-mono-latin-wght-normal.woff2", "200 800"),
  ].join("");

/** Turns SVG into PNG files with the browser that the tests use. @param fileOf where picture number n goes */
export async function paint(pictures: readonly Drawn[], fileOf: (index: number) => string): Promise<void> {
  const browser = await chromium.launch({ executablePath: findProgram("chromium") ?? "chromium", args: ["--no-sandbox", "--disable-gpu", "--disable-background-networking"] });
  try {
    const page = await browser.newPage({ viewport: { width: WIDTH, height: HEIGHT } });
    await page.setContent(`<style>${fontFaces()}body{margin:0}</style><div id="frame"></div>`);
    await warmFonts(page);
    for (const [index, { svg }] of pictures.entries()) {
      await page.evaluate((markup) => {
        const holder = document.getElementById("frame");
        if (holder) holder.innerHTML = markup;
      }, svg);
      await page.screenshot({ path: fileOf(index), type: "png" });
    }
  } finally {
    await browser.close();
  }
}

/** A font is only loaded once it is asked for; the first picture must not be the one that asks. */
async function warmFonts(page: Page): Promise<void> {
  await page.evaluate(() => Promise.all([...document.fonts].map((face) => face.load())));
}
