import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { script as belt } from "@/db/seeds/demo/films/auxiliary-belt/script";
import { script as discs } from "@/db/seeds/demo/films/front-brake-discs/script";
import type { FilmScript } from "@/db/seeds/demo/films/types";
import { framesOf, paint } from "@/lib/cli/film/draw";
import { encodeFilm, lengthOf, makePictures, sizeOf } from "@/lib/cli/film/encode";
import { SAMPLE_RATE, speak, wav } from "@/lib/cli/film/speech";
import { captionsOf, layOut, type Timeline } from "@/lib/cli/film/timeline";
import { escapeCueText } from "@/lib/core/webvtt/cue-text";
import { formatTimestamp } from "@/lib/core/webvtt/timestamps";
import { findProgram } from "../programs.mjs";

const NEEDS = ["espeak-ng", "ffmpeg", "ffprobe", "chromium"];

// Makes the demo's films anew: speaks their lines, lays them out in time, draws every frame and encodes. `npm run film -- KEY` makes one.
// The made files are shipped, so nobody else needs to wait for this.
async function makeFilm(script: FilmScript): Promise<void> {
  const media = join(process.cwd(), "db/seeds/demo/films", script.key, "media");
  const folder = mkdtempSync(join(tmpdir(), "film-"));
  mkdirSync(media, { recursive: true });
  try {
    const spoken = script.steps.flatMap((step) => step.scenes.flatMap((scene) => scene.lines.map((line) => speak(line.text, script.voice))));
    const timeline = layOut(script, spoken.map((samples) => Math.round((samples.length / SAMPLE_RATE) * 1000)));
    writeFileSync(join(folder, "speech.wav"), wav(soundOf(timeline, spoken)));
    const pictures = framesOf(script.vehicle, timeline.scenes, timeline.timings.durationMs);
    console.log(`${script.title}: ${Math.round(timeline.timings.durationMs / 1000)} s, ${pictures.length} pictures`);
    await paint(pictures, (index) => join(folder, `f${index}.png`));
    encodeFilm(folder, pictures, media);
    // The encoder may end a frame early; no step may run past the film.
    fitTo(timeline, Math.min(timeline.timings.durationMs, lengthOf(join(media, "720p.mp4")), lengthOf(join(media, "480p.mp4"))));
    makePictures(media, timeline.timings.durationMs, posterAt(timeline));
    writeFileSync(join(media, "timings.json"), `${JSON.stringify(timeline.timings, null, 1)}\n`);
    writeFileSync(join(media, "captions.vtt"), captions(timeline));
    for (const name of ["720p.mp4", "480p.mp4", "poster.jpg", "storyboard.jpg"]) console.log(`  ${name} ${Math.round(sizeOf(join(media, name)) / 1024)} KiB`);
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

/** The spoken lines at their times, silence between. */
function soundOf({ timings }: Timeline, spoken: readonly Int16Array[]): Int16Array {
  const sound = new Int16Array(Math.ceil((timings.durationMs / 1000) * SAMPLE_RATE));
  timings.lines.forEach((line, index) => sound.set(spoken[index] ?? new Int16Array(0), Math.round((line.startMs / 1000) * SAMPLE_RATE)));
  return sound;
}

function fitTo({ timings }: Timeline, durationMs: number): void {
  timings.durationMs = durationMs;
  for (const part of [timings.steps.at(-1), timings.scenes.at(-1)]) if (part) part.endMs = durationMs;
}

/** The poster shows the middle of the first scene with a value on it. */
function posterAt({ scenes }: Timeline): number {
  const scene = scenes.find((candidate) => candidate.scene.lines.some((line) => line.plates?.some((plate) => plate.kind === "value")));
  return scene ? scene.endMs - 400 : 1000;
}

function captions({ timings }: Timeline): string {
  const cues = captionsOf(timings).map(({ startMs, endMs, text }) => `\n${formatTimestamp(startMs)} --> ${formatTimestamp(endMs)}\n${escapeCueText(text)}\n`);
  return `WEBVTT\n${cues.join("")}`;
}

async function main(): Promise<void> {
  const missing = NEEDS.filter((name) => !findProgram(name));
  if (missing.length > 0) throw new Error(`Missing on this machine: ${missing.join(", ")}. On Debian: apt-get install espeak-ng ffmpeg chromium`);
  const wanted = process.argv.slice(2);
  const unknown = wanted.filter((key) => ![discs, belt].some((script) => script.key === key));
  if (unknown.length > 0) throw new Error(`There is no film “${unknown.join(", ")}”. The films: ${discs.key}, ${belt.key}.`);
  for (const script of [discs, belt]) if (wanted.length === 0 || wanted.includes(script.key)) await makeFilm(script);
}

main().catch((error: unknown) => {
  console.error(error instanceof Error ? error.message : error);
  process.exit(1);
});
