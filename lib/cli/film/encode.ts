import { execFileSync } from "node:child_process";
import { readFileSync, writeFileSync } from "node:fs";
import { join } from "node:path";
import { FRAMES_PER_SECOND, type Drawn } from "@/lib/cli/film/draw";
import { formatTimestamp } from "@/lib/core/webvtt/timestamps";

const ffmpeg = (...args: string[]): void => void execFileSync("ffmpeg", ["-hide_banner", "-loglevel", "error", "-y", ...args]);

const VIDEO = ["-c:v", "libx264", "-preset", "veryslow", "-tune", "animation", "-pix_fmt", "yuv420p", "-g", String(FRAMES_PER_SECOND * 10), "-movflags", "+faststart"];
// Talking must stay audible in a workshop: about -16 LUFS (EBU R 128). The synthesiser's hard peaks are pressed first and held below
// full scale afterwards, with room for what the encoder adds; its noise shaping (tns, pns) adds most, and is off. The speech holds nothing
// above 8 kHz worth its bits.
const LOUDNESS = "highpass=f=80,acompressor=threshold=0.06:ratio=4:attack=2:release=60,loudnorm=I=-14.2:TP=-2:LRA=7,aresample=22050,alimiter=limit=0.55:attack=3:release=50:level=false";
const SOUND = ["-c:a", "aac", "-b:a", "32k", "-ac", "1", "-ar", "22050", "-cutoff", "8000", "-aac_pns", "0", "-aac_tns", "0"];
// The same words make the same bytes: no dates or versions inside.
const PLAIN = ["-map_metadata", "-1", "-fflags", "+bitexact", "-flags:v", "+bitexact", "-flags:a", "+bitexact"];

/** Puts pictures and sound together at two sizes, index up front. */
export function encodeFilm(folder: string, pictures: readonly Drawn[], media: string): void {
  const list = pictures.map(({ frames }, index) => `file 'f${index}.png'\nduration ${frames / FRAMES_PER_SECOND}`).join("\n");
  writeFileSync(join(folder, "frames.txt"), `ffconcat version 1.0\n${list}\nfile 'f${pictures.length - 1}.png'\n`);
  ffmpeg("-i", join(folder, "speech.wav"), "-af", LOUDNESS, ...SOUND, join(folder, "speech.m4a"));
  for (const { name, height, crf } of [
    { name: "720p", height: 720, crf: 32 },
    { name: "480p", height: 480, crf: 35 },
  ]) {
    ffmpeg(
      ...["-f", "concat", "-safe", "0", "-i", join(folder, "frames.txt"), "-i", join(folder, "speech.m4a")],
      ...["-vf", `fps=${FRAMES_PER_SECOND},scale=-2:${height}`, "-crf", String(crf), ...VIDEO, "-c:a", "copy", "-shortest", ...PLAIN],
      join(media, `${name}.mp4`),
    );
  }
}

/** Storyboard: one small picture every so many seconds on a sheet, and the track that says where each lies. */
const TILE = { everyMs: 5000, width: 160, height: 90, columns: 10 };

/** Poster, storyboard sheet and its WebVTT track (#xywh, W3C Media Fragments). */
export function makePictures(media: string, durationMs: number, posterMs: number): void {
  const film = join(media, "720p.mp4");
  ffmpeg("-ss", String(posterMs / 1000), "-i", film, "-frames:v", "1", "-q:v", "5", join(media, "poster.jpg"));
  const count = Math.ceil(durationMs / TILE.everyMs);
  const rows = Math.ceil(count / TILE.columns);
  ffmpeg(
    ...["-i", film, "-vf", `fps=1000/${TILE.everyMs},scale=${TILE.width}:${TILE.height},tile=${TILE.columns}x${rows}`],
    ...["-frames:v", "1", "-q:v", "6", join(media, "storyboard.jpg")],
  );
  const cues = Array.from({ length: count }, (_, index) => {
    const [x, y] = [(index % TILE.columns) * TILE.width, Math.floor(index / TILE.columns) * TILE.height];
    const end = Math.min((index + 1) * TILE.everyMs, durationMs);
    return `\n${formatTimestamp(index * TILE.everyMs)} --> ${formatTimestamp(end)}\nstoryboard.jpg#xywh=${x},${y},${TILE.width},${TILE.height}\n`;
  });
  writeFileSync(join(media, "storyboard.vtt"), `WEBVTT\n${cues.join("")}`);
}

/** Length of a file's longest stream in ms. */
export function lengthOf(file: string): number {
  const seconds = execFileSync("ffprobe", ["-v", "error", "-show_entries", "format=duration", "-of", "csv=p=0", file]).toString();
  return Math.floor(Number(seconds) * 1000);
}

export const sizeOf = (file: string): number => readFileSync(file).length;
