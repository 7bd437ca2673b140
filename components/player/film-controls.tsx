"use client";

import { formatClock } from "@/lib/core/webvtt/timestamps";

const RATES = [0.5, 0.75, 1, 1.25, 1.5, 2] as const;

type FilmControlsProps = {
  playing: boolean;
  atMs: number;
  startMs: number;
  endMs: number;
  rate: number;
  captionsOn: boolean;
  onToggle: () => void;
  onSeek: (ms: number) => void;
  onRate: (rate: number) => void;
  onCaptions: (on: boolean) => void;
  onFullScreen: () => void;
};

const KEY =
  "inline-flex min-h-11 min-w-11 items-center justify-center rounded px-2 font-plate text-[1.1rem] font-semibold text-deep-ink hover:bg-film/30";

/** Our own controls under the picture: every one a real button or slider, at least 44 px. */
export function FilmControls(props: FilmControlsProps) {
  const { playing, atMs, startMs, endMs, rate, captionsOn } = props;
  return (
    <div data-on-deep className="flex flex-wrap items-center gap-x-1 bg-deep px-2 text-deep-ink">
      <button type="button" className={`${KEY} min-w-16`} onClick={props.onToggle}>
        {playing ? "Pause" : "Play"}
      </button>
      <button type="button" className={KEY} onClick={() => props.onSeek(atMs - 10_000)} aria-label="Back ten seconds">
        −10 s
      </button>
      <label className="flex min-h-11 min-w-40 flex-1 items-center">
        <span className="sr-only">Place in this step</span>
        <input
          type="range"
          className="w-full accent-(--deep-line)"
          min={startMs}
          max={Math.max(endMs, startMs + 1)}
          step={100}
          value={Math.min(Math.max(atMs, startMs), endMs)}
          onChange={(event) => props.onSeek(Number(event.target.value))}
          aria-valuetext={formatClock(atMs)}
        />
      </label>
      <span className="tabular px-2 font-mono text-sm">
        {formatClock(Math.max(0, atMs - startMs))} / {formatClock(endMs - startMs)}
      </span>
      <label className="flex min-h-11 items-center gap-1">
        <span className="sr-only">Rate</span>
        <select className="min-h-11 rounded bg-deep px-1 font-mono text-deep-ink" value={rate} onChange={(event) => props.onRate(Number(event.target.value))}>
          {RATES.map((value) => (
            <option key={value} value={value}>
              {value}×
            </option>
          ))}
        </select>
      </label>
      <button type="button" className={KEY} aria-pressed={captionsOn} onClick={() => props.onCaptions(!captionsOn)}>
        {captionsOn ? "Captions on" : "Captions off"}
      </button>
      <button type="button" className={KEY} onClick={props.onFullScreen}>
        Full screen
      </button>
    </div>
  );
}
