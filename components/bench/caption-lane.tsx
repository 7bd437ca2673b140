type Caption = { startMs: number; endMs: number; text: string };

/** Narrower than this, a caption shows no words of its own. */
const READABLE_PX = 90;

/** What is said, where it is said. Where there is no room for the words, those of the film's place are shown whole. */
export function CaptionLane({ durationMs, widthPx, atMs, captions }: { durationMs: number; widthPx: number; atMs: number; captions: Caption[] }) {
  const now = captions.findLast((caption) => atMs >= caption.startMs);
  const share = (ms: number) => (ms / durationMs) * 100;
  const readable = (caption: Caption) => ((caption.endMs - caption.startMs) / durationMs) * widthPx >= READABLE_PX;
  const late = atMs > durationMs / 2;
  return (
    <div className="relative h-10 overflow-hidden" aria-hidden>
      {captions.map((caption) => (
        <span
          key={caption.startMs}
          title={caption.text}
          className={`absolute overflow-hidden text-ellipsis whitespace-nowrap border-t-4 pt-1 text-[0.85rem] ${caption === now ? "border-line" : "border-steel"} text-ink2`}
          style={{ left: `${share(caption.startMs)}%`, width: `calc(${share(caption.endMs - caption.startMs)}% - 2px)` }}
        >
          {readable(caption) && caption.text}
        </span>
      ))}
      {now && !readable(now) && (
        <span className="absolute top-1.5 whitespace-nowrap bg-chalk px-1.5 text-[0.9rem]" style={late ? { right: `${100 - share(now.endMs)}%` } : { left: `${share(now.startMs)}%` }}>
          {now.text}
        </span>
      )}
    </div>
  );
}
