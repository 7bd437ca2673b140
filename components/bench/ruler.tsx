"use client";

import { useEffect, useRef } from "react";
import { formatClock } from "@/lib/core/webvtt/timestamps";
import type { Question } from "@/lib/core/questions/types";
import type { Step } from "@/lib/core/steps/types";

export type Chosen = { kind: "step" | "question"; id: string } | null;

type RulerProps = {
  durationMs: number;
  atMs: number;
  zoom: number;
  steps: Step[];
  questions: Question[];
  captions: { startMs: number; endMs: number; text: string }[];
  storyboard: { sheet: string; tiles: { startMs: number; endMs: number; x: number; y: number; width: number; height: number }[] } | null;
  chosen: Chosen;
  onSeek: (ms: number) => void;
  onChoose: (chosen: Chosen) => void;
};

const LANE = "relative border-b border-rule";

/** One ruler for everything on the bench: pictures, steps, questions, captions. */
export function Ruler(props: RulerProps) {
  const { durationMs, atMs, zoom, steps, questions, captions, chosen } = props;
  const scroller = useRef<HTMLDivElement>(null);
  const percent = (ms: number) => `${(ms / durationMs) * 100}%`;
  const width = (from: number, to: number) => `${((to - from) / durationMs) * 100}%`;

  // Zoomed in, the place of the film stays in sight.
  useEffect(() => {
    const element = scroller.current;
    if (!element || zoom === 1) return;
    const x = (atMs / durationMs) * element.scrollWidth;
    if (x < element.scrollLeft + 40 || x > element.scrollLeft + element.clientWidth - 40) element.scrollLeft = x - element.clientWidth / 3;
  }, [atMs, durationMs, zoom]);

  return (
    <div className="grid grid-cols-[4.5rem_1fr] border-y border-rule bg-chalk sm:grid-cols-[6.5rem_1fr]">
      <div className="border-r-2 border-steel bg-enamel font-plate text-[1rem] font-semibold text-ink2" aria-hidden>
        <p className="h-7 px-2 pt-1">Time</p>
        <p className="h-12 px-2 pt-2.5">Picture</p>
        <p className="h-12 px-2 pt-2.5">Steps</p>
        <p className="h-10 px-2 pt-1.5">Questions</p>
        <p className="h-9 px-2 pt-1.5">Captions</p>
      </div>
      <div ref={scroller} className="relative overflow-x-auto overflow-y-hidden">
        <div className="relative" style={{ width: `${zoom * 100}%` }}>
          <Ticks durationMs={durationMs} zoom={zoom} onSeek={props.onSeek} />
          <div className={`${LANE} h-12 overflow-hidden bg-film`}>
            {props.storyboard?.tiles.map((tile) => (
              <span
                key={tile.startMs}
                className="absolute inset-y-0 border-r border-film"
                style={{
                  left: percent(tile.startMs),
                  width: width(tile.startMs, tile.endMs),
                  backgroundImage: `url("${props.storyboard?.sheet}")`,
                  backgroundPosition: `-${tile.x}px -${tile.y + (tile.height - 48) / 2}px`,
                }}
              />
            ))}
          </div>
          <div className={`${LANE} h-12`}>
            {steps.map((step) => {
              const on = chosen?.kind === "step" && chosen.id === step.id;
              return (
                <button
                  key={step.id}
                  type="button"
                  aria-pressed={on}
                  title={step.title || "no name yet"}
                  onClick={() => props.onChoose({ kind: "step", id: step.id })}
                  style={{ left: percent(step.startMs), width: width(step.startMs, step.endMs) }}
                  className={`absolute inset-y-1 overflow-hidden whitespace-nowrap rounded border-[1.5px] px-1.5 text-left font-plate text-[1rem] font-semibold ${
                    on ? "border-strong bg-strong text-strong-ink" : "border-strong bg-tint text-strong"
                  }`}
                >
                  {step.title || "no name yet"}
                </button>
              );
            })}
          </div>
          <div className={`${LANE} h-10`}>
            {questions.map((question, index) => {
              const on = chosen?.kind === "question" && chosen.id === question.id;
              return (
                <button
                  key={question.id}
                  type="button"
                  aria-pressed={on}
                  aria-label={`Question ${index + 1} at ${formatClock(question.atMs)}: ${question.prompt || "not written yet"}`}
                  onClick={() => props.onChoose({ kind: "question", id: question.id })}
                  style={{ left: percent(question.atMs) }}
                  className={`absolute top-1.5 size-7 -translate-x-1/2 rounded-full border-2 font-plate text-[0.95rem] font-semibold leading-none ${
                    on ? "border-line bg-chalk text-ink" : "border-ink bg-ink text-chalk"
                  }`}
                >
                  {index + 1}
                </button>
              );
            })}
          </div>
          <div className="relative h-9" aria-hidden>
            {captions.map((caption) => (
              <span
                key={caption.startMs}
                title={caption.text}
                className="absolute inset-y-1 overflow-hidden whitespace-nowrap border-l border-rule pl-1 text-[0.8rem] text-ink2"
                style={{ left: percent(caption.startMs), width: width(caption.startMs, caption.endMs) }}
              >
                {caption.text}
              </span>
            ))}
          </div>
          <span aria-hidden className="pointer-events-none absolute inset-y-0 w-0.5 bg-line" style={{ left: percent(atMs) }} />
        </div>
      </div>
    </div>
  );
}

/** Distances of ticks that read well, in ms. */
const TICKS = [1000, 2000, 5000, 10_000, 15_000, 30_000, 60_000, 120_000, 300_000, 600_000];

function Ticks({ durationMs, zoom, onSeek }: { durationMs: number; zoom: number; onSeek: (ms: number) => void }) {
  const every = TICKS.find((distance) => durationMs / distance <= 12 * zoom) ?? 1_200_000;
  return (
    <button
      type="button"
      aria-label="Go to the place pressed on the ruler"
      className="relative block h-7 w-full border-b border-rule"
      onClick={(event) => {
        const box = event.currentTarget.getBoundingClientRect();
        if (event.detail > 0) onSeek(Math.round(((event.clientX - box.left) / box.width) * durationMs));
      }}
    >
      {Array.from({ length: Math.floor(durationMs / every) + 1 }, (_, index) => (
        <span key={index} className="tabular absolute inset-y-0 border-l border-steel pl-1 pt-1 font-mono text-[0.7rem] text-ink2" style={{ left: `${((index * every) / durationMs) * 100}%` }}>
          {formatClock(index * every)}
        </span>
      ))}
    </button>
  );
}
