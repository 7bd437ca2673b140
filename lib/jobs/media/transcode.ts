import { stat } from "node:fs/promises";
import { renditionSize, type Size } from "@/lib/core/recordings/rendition-size";
import { formatClock } from "@/lib/core/webvtt/timestamps";
import { MediaFault } from "@/lib/jobs/media/media-fault";
import { probeFilm, progressMicroseconds, type FilmFacts } from "@/lib/jobs/media/probe";
import { readingOptions } from "@/lib/jobs/media/reading";
import { runProgram } from "@/lib/jobs/media/run-program";

/** Kilobits per second that the picture may take at most. */
const MOST_KILOBITS = { 480: 1200, 720: 2800 } as const;
export type ShorterSide = keyof typeof MOST_KILOBITS;

const AUDIO_KILOBITS = 96;
/** Slower machines than this, against the film's own length, are given up on. */
const TIMES_SLOWER = 15;

export type Work = { signal: AbortSignal; onPercent: (percent: number) => void };

/**
 * Makes an MP4 (H.264, AAC) that starts to play before it is loaded: index up front, a picture to jump to every two seconds, upright, never
 * larger than the source, on the source's own time axis, and without the camera's notes, which may say where it was filmed.
 * @returns the size of its picture
 * @throws MediaFault
 */
export async function transcode(source: string, facts: FilmFacts, side: ShorterSide, target: string, work: Work): Promise<Size> {
  const size = renditionSize(facts, side);
  const most = MOST_KILOBITS[side];
  // Twice what the bit rates allow, and room for the index of a short film: past that something is wrong.
  const mostBytes = Math.ceil((facts.durationMs / 8) * (most + AUDIO_KILOBITS) * 2) + 5_000_000;
  const filters = [`scale=${size.width}:${size.height}:flags=bicubic`, "setsar=1", ...(facts.framesPerSecond > 61 ? ["fps=60"] : [])];
  const sound = facts.audioIndex === null ? ["-an"] : [
    "-map", `0:${facts.audioIndex}`, "-c:a", "aac", "-b:a", `${AUDIO_KILOBITS}k`, "-ac", "2", "-ar", "48000", "-af", "aresample=async=1000",
  ];
  const args = [
    "-nostdin", "-hide_banner", "-v", "error", "-y", "-threads", "4", ...readingOptions(source),
    "-map", `0:${facts.videoIndex}`, "-vf", filters.join(","), "-fps_mode", "vfr",
    "-c:v", "libx264", "-preset", "veryfast", "-crf", "23", "-maxrate", `${most}k`, "-bufsize", `${most * 2}k`,
    "-profile:v", "high", "-pix_fmt", "yuv420p", "-threads", "4", "-force_key_frames", "expr:gte(t,n_forced*2)",
    ...sound, "-sn", "-dn", "-map_metadata", "-1", "-map_chapters", "-1", "-movflags", "+faststart", "-video_track_timescale", "90000",
    "-fs", String(mostBytes), "-progress", "pipe:1", "-f", "mp4", `file:${target}`,
  ];
  await runProgram("ffmpeg", args, {
    seconds: 600 + (facts.durationMs / 1000) * TIMES_SLOWER,
    fileBytes: mostBytes * 2,
    signal: work.signal,
    onLine: (line) => {
      const done = progressMicroseconds(line);
      if (done !== undefined) work.onPercent(Math.min(99, done / 10 / facts.durationMs));
    },
  });
  await assertWhole(target, facts.durationMs, work.signal);
  return size;
}

/** A film that breaks off, or outgrows its bounds, ends without an error of the converter: hold what was made against the source. */
async function assertWhole(path: string, durationMs: number, signal: AbortSignal): Promise<void> {
  if ((await stat(path)).size === 0) throw new MediaFault("No picture of the film could be read.");
  const made = await probeFilm(path, Number.POSITIVE_INFINITY, signal).catch((error: unknown) => {
    if (error instanceof MediaFault) throw new MediaFault("No moving picture of the film could be read.", error.log);
    throw error;
  });
  const allowed = Math.max(1000, durationMs * 0.02);
  if (made.durationMs < durationMs - allowed) {
    throw new MediaFault(`The film breaks off at ${formatClock(made.durationMs)} of ${formatClock(durationMs)}. Copy it from the phone or camera again.`);
  }
}
