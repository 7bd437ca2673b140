import type { StoryboardTile } from "@/lib/core/webvtt/storyboard";

export type Storyboard = { sheet: string; tiles: StoryboardTile[] };

const HEIGHT_PX = 52;

/** As many small pictures of the film as there is room for, each where it stands. */
export function PictureLane({ storyboard, durationMs, widthPx }: { storyboard: Storyboard | null; durationMs: number; widthPx: number }) {
  const first = storyboard?.tiles[0];
  const scale = first ? HEIGHT_PX / first.height : 1;
  const slots = first ? Math.max(1, Math.ceil(widthPx / (first.width * scale))) : 0;
  const slotMs = durationMs / slots;
  const tileAt = (ms: number) => storyboard?.tiles.find((tile) => ms >= tile.startMs && ms < tile.endMs) ?? storyboard?.tiles.at(-1);
  return (
    <div className="relative h-13 overflow-hidden border-b border-rule bg-film">
      {widthPx > 0 &&
        Array.from({ length: slots }, (_, index) => {
          const tile = tileAt((index + 0.5) * slotMs);
          if (!tile) return null;
          return (
            <span key={index} className="absolute inset-y-0 overflow-hidden border-r border-film" style={{ left: `${(index / slots) * 100}%`, width: `${100 / slots}%` }}>
              <span
                className="block origin-top-left"
                style={{
                  width: tile.width,
                  height: tile.height,
                  transform: `scale(${scale})`,
                  backgroundImage: `url("${storyboard?.sheet}")`,
                  backgroundPosition: `-${tile.x}px -${tile.y}px`,
                }}
              />
            </span>
          );
        })}
    </div>
  );
}
