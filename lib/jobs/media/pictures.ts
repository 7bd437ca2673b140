import type { Size } from "@/lib/core/recordings/rendition-size";
import { planStoryboard, type StoryboardPlan } from "@/lib/core/recordings/storyboard";
import { readingOptions } from "@/lib/jobs/media/reading";
import { runProgram } from "@/lib/jobs/media/run-program";
import type { Work } from "@/lib/jobs/media/transcode";

const MOST_PICTURE_BYTES = 20_000_000;
const FAST_MS = 4000;

const quiet = ["-nostdin", "-hide_banner", "-v", "error", "-y"];

/** One picture that stands for the film: early in it, and the most typical of its surroundings rather than a black or blurred one. */
export async function makePoster(film: string, durationMs: number, target: string, { signal }: Work): Promise<void> {
  const atSeconds = Math.min(durationMs * 0.1, 5000) / 1000;
  const args = [
    ...quiet, "-ss", atSeconds.toFixed(3), ...readingOptions(film),
    "-vf", "thumbnail=30", "-frames:v", "1", "-q:v", "3", "-map_metadata", "-1", "-f", "image2", "-update", "1", `file:${target}`,
  ];
  await runProgram("ffmpeg", args, { seconds: 300, fileBytes: MOST_PICTURE_BYTES, signal });
}

/** Small pictures of the whole film on one sheet. Returns how it is laid out. */
export async function makeStoryboard(film: string, durationMs: number, picture: Size, target: string, { signal }: Work): Promise<StoryboardPlan> {
  const plan = planStoryboard(durationMs, picture);
  // Our own films have a picture to jump to every two seconds: reading only those is many times faster where they are enough.
  const onlyKeys = plan.intervalMs >= FAST_MS ? ["-skip_frame", "nokey"] : [];
  const filters = [
    `fps=1000/${plan.intervalMs}`,
    `scale=${plan.tile.width}:${plan.tile.height}`,
    `tile=${plan.columns}x${plan.rows}`,
  ];
  const args = [
    ...quiet, ...onlyKeys, ...readingOptions(film),
    "-an", "-vf", filters.join(","), "-frames:v", "1", "-q:v", "4", "-map_metadata", "-1", "-f", "image2", "-update", "1", `file:${target}`,
  ];
  await runProgram("ffmpeg", args, { seconds: 300 + durationMs / 1000, fileBytes: MOST_PICTURE_BYTES, signal });
  return plan;
}
