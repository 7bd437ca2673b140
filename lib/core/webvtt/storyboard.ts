import { readVtt } from "@/lib/core/webvtt/read-vtt";

/** A small picture of the storyboard's sheet, and the stretch of film it stands for. Pixels on the sheet, ms of the film. */
export type StoryboardTile = { startMs: number; endMs: number; x: number; y: number; width: number; height: number };

/**
 * Reads a storyboard track whose cues name a part of a sheet, like `storyboard.jpg#xywh=160,0,160,90`. Cues that name none are left out.
 * @source W3C Media Fragments URI 1.0, "Spatial Dimension" in pixels
 */
export function readStoryboard(vtt: string): StoryboardTile[] {
  return readVtt(vtt).cues.flatMap(({ startMs, endMs, text }) => {
    const match = /#xywh=(?:pixel:)?(\d+),(\d+),(\d+),(\d+)\s*$/.exec(text);
    if (!match) return [];
    const [x = 0, y = 0, width = 0, height = 0] = match.slice(1).map(Number);
    return [{ startMs, endMs, x, y, width, height }];
  });
}
