"use client";

import type { ReactNode } from "react";
import { KeyCap } from "@/components/ui/tag";
import { formatClock } from "@/lib/core/webvtt/timestamps";

type TransportProps = {
  atMs: number;
  durationMs: number;
  playing: boolean;
  zoom: number;
  onToggle: () => void;
  onStep: (byMs: number) => void;
  onRate: (rate: number) => void;
  onZoom: (zoom: number) => void;
};

const RATES = [0.5, 1, 1.5, 2] as const;
/** How many times the ruler is longer than its place on the page. */
export const ZOOMS = [1, 2, 4, 8, 16] as const;
/** One picture of a film at 25 a second. */
const PICTURE_MS = 40;

/** Under the picture: where the film stands, and every way to move it, with its key. */
export function Transport({ atMs, durationMs, playing, zoom, onToggle, onStep, onRate, onZoom }: TransportProps) {
  return (
    <div data-on-deep className="flex flex-wrap items-center gap-x-2 gap-y-1 bg-deep px-2 py-1 text-deep-ink sm:px-3">
      <div className="flex items-center">
        <Move label="Back five seconds" onClick={() => onStep(-5000)}>
          <KeyCap>J</KeyCap>−5 s
        </Move>
        <Move label="Back a picture" onClick={() => onStep(-PICTURE_MS)}>
          <KeyCap>,</KeyCap>‹
        </Move>
        <button type="button" onClick={onToggle} className="flex min-h-11 min-w-22 items-center justify-center gap-1.5 rounded px-2 sm:min-w-24 font-plate text-[1.2rem] font-semibold hover:bg-film/40">
          <KeyCap>K</KeyCap> {playing ? "Pause" : "Play"}
        </button>
        <Move label="On a picture" onClick={() => onStep(PICTURE_MS)}>
          <KeyCap>.</KeyCap>›
        </Move>
        <Move label="On five seconds" onClick={() => onStep(5000)}>
          <KeyCap>L</KeyCap>+5 s
        </Move>
      </div>
      <p className="tabular whitespace-nowrap px-1 font-mono sm:text-[1.1rem]">
        {formatClock(atMs)}.{String(Math.floor((atMs % 1000) / 10)).padStart(2, "0")} <span className="text-deep-soft">/ {formatClock(durationMs)}</span>
      </p>
      <div className="ml-auto flex items-center gap-2">
        <Choice label="Rate of the film" value={null} onChange={onRate} options={RATES.map((rate) => ({ value: rate, words: `${rate}×` }))} />
        <Choice label="Zoom of the ruler" value={zoom} onChange={onZoom} options={ZOOMS.map((value) => ({ value, words: value === 1 ? "whole" : `zoom ${value}×` }))} />
      </div>
    </div>
  );
}

const Move = ({ label, onClick, children }: { label: string; onClick: () => void; children: ReactNode }) => (
  <button type="button" aria-label={label} title={label} onClick={onClick} className="flex min-h-11 min-w-11 items-center justify-center gap-1.5 whitespace-nowrap rounded px-1 font-plate text-[1.1rem] hover:bg-film/40 sm:px-2">
    {children}
  </button>
);

type ChoiceProps = { label: string; value: number | null; onChange: (value: number) => void; options: { value: number; words: string }[] };

const Choice = ({ label, value, onChange, options }: ChoiceProps) => (
  <label>
    <span className="sr-only">{label}</span>
    <select
      className="min-h-11 rounded border border-deep-soft/60 bg-deep px-1 font-mono text-[0.95rem] sm:px-2"
      {...(value === null ? { defaultValue: 1 } : { value })}
      onChange={(event) => onChange(Number(event.target.value))}
    >
      {options.map((option) => (
        <option key={option.value} value={option.value}>
          {option.words}
        </option>
      ))}
    </select>
  </label>
);
