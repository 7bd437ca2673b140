import type { Size } from "@/lib/core/recordings/rendition-size";
import { formatTimestamp } from "@/lib/core/webvtt/timestamps";

/** A sheet of small pictures, row by row from the top left, one for each stretch of `intervalMs`. */
export type StoryboardPlan = { intervalMs: number; tile: Size; columns: number; rows: number; tiles: number };

const COLUMNS = 12;
const MOST_TILES = 144;
const SHORTEST_INTERVAL_MS = 1000;
const LONGER_SIDE = 160;

const even = (value: number): number => Math.max(2, 2 * Math.round(value / 2));

/** How the storyboard of a film is laid out. @param picture  the film's shown size */
export function planStoryboard(durationMs: number, picture: Size): StoryboardPlan {
  const intervalMs = Math.max(SHORTEST_INTERVAL_MS, Math.ceil(durationMs / MOST_TILES / 500) * 500);
  const tiles = Math.max(1, Math.ceil(durationMs / intervalMs));
  const columns = Math.min(COLUMNS, tiles);
  const scale = LONGER_SIDE / Math.max(picture.width, picture.height);
  return {
    intervalMs,
    tiles,
    columns,
    rows: Math.ceil(tiles / columns),
    tile: { width: even(picture.width * scale), height: even(picture.height * scale) },
  };
}

/**
 * The storyboard's WebVTT track: which part of the sheet shows which stretch of the film.
 * @source W3C Media Fragments URI 1.0, "Spatial dimension": `#xywh=x,y,w,h` in points from the top left
 */
export function writeStoryboardTrack(plan: StoryboardPlan, durationMs: number, sheetName: string): string {
  const cues = Array.from({ length: plan.tiles }, (_, index) => {
    const start = index * plan.intervalMs;
    const end = Math.min(start + plan.intervalMs, durationMs);
    const [x, y] = [(index % plan.columns) * plan.tile.width, Math.floor(index / plan.columns) * plan.tile.height];
    return `\n${formatTimestamp(start)} --> ${formatTimestamp(end)}\n${sheetName}#xywh=${x},${y},${plan.tile.width},${plan.tile.height}\n`;
  });
  return `WEBVTT\n${cues.join("")}`;
}
