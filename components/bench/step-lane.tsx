"use client";

import { useRef, type KeyboardEvent } from "react";
import type { BenchAct } from "@/components/bench/bench-state";
import type { Chosen } from "@/components/bench/chosen";
import { shortTime } from "@/components/bench/time-field";
import { useDrag } from "@/components/bench/use-drag";
import { CautionSign } from "@/components/ui/caution";
import type { Step } from "@/lib/core/steps/types";

type StepLaneProps = {
  durationMs: number;
  atMs: number;
  steps: Step[];
  chosen: Chosen;
  onSeek: (ms: number) => void;
  onChoose: (chosen: Chosen) => void;
  act: (act: BenchAct) => void;
};

/** Steps as plates on the ruler. The edges of the one that is chosen can be dragged, or moved with the arrow keys. */
export function StepLane({ durationMs, atMs, steps, chosen, onSeek, onChoose, act }: StepLaneProps) {
  const lane = useRef<HTMLDivElement>(null);
  const picked = chosen?.kind === "step" ? steps.find((step) => step.id === chosen.id) : undefined;
  return (
    <div ref={lane} className="relative h-14 border-b border-rule">
      {steps.map((step, index) => {
        const on = step === picked;
        const here = atMs >= step.startMs && atMs < step.endMs;
        return (
          <button
            key={step.id}
            type="button"
            aria-pressed={on}
            title={`${index + 1}. ${step.title}`}
            onClick={() => onChoose({ kind: "step", id: step.id })}
            style={{ left: `${(step.startMs / durationMs) * 100}%`, width: `max(calc(${((step.endMs - step.startMs) / durationMs) * 100}% - 1px), 4px)` }}
            className={`absolute inset-y-1 flex items-center gap-1.5 overflow-hidden whitespace-nowrap rounded border-[1.5px] px-1.5 text-left font-plate text-[1.05rem] font-semibold leading-none ${
              on ? "border-strong bg-strong pl-3 text-strong-ink" : `border-strong text-strong ${here ? "bg-rule" : "bg-tint"}`
            }`}
          >
            <span className="tabular opacity-80">{index + 1}</span>
            {step.facts.cautions.length > 0 && (
              <span className="grid size-5 shrink-0 place-items-center rounded bg-caution text-caution-ink">
                <span className="sr-only">with a caution</span>
                <CautionSign size={14} />
              </span>
            )}
            <span className="overflow-hidden text-ellipsis">{step.title}</span>
          </button>
        );
      })}
      {picked &&
        (["set_start", "set_end"] as const).map((edge) => (
          <Edge
            key={edge}
            label={`${edge === "set_start" ? "Beginning" : "End"} of step ${steps.indexOf(picked) + 1}`}
            ms={edge === "set_start" ? picked.startMs : picked.endMs}
            durationMs={durationMs}
            lane={() => lane.current?.getBoundingClientRect()}
            onMove={(ms, strand) => {
              act({ do: edge, stepId: picked.id, atMs: ms, durationMs, strand });
              onSeek(ms);
            }}
          />
        ))}
    </div>
  );
}

type EdgeProps = { label: string; ms: number; durationMs: number; lane: () => DOMRect | undefined; onMove: (ms: number, strand: string) => void };

/** One picture of a film at 25 a second. */
const PICTURE_MS = 40;

/** An edge to take hold of: dragged, or by arrow keys a picture at a time, with Shift a second. */
function Edge({ label, ms, durationMs, lane, onMove }: EdgeProps) {
  const drag = useDrag(lane, (share, strand) => onMove(Math.round(share * durationMs), strand));
  const onKeyDown = (event: KeyboardEvent) => {
    const direction = { ArrowLeft: -1, ArrowRight: 1 }[event.key];
    if (!direction) return;
    // The bench's own arrow keys would move the film instead.
    event.preventDefault();
    event.stopPropagation();
    onMove(ms + direction * (event.shiftKey ? 1000 : PICTURE_MS), `edge ${label}`);
  };
  return (
    <span
      {...drag}
      onKeyDown={onKeyDown}
      role="slider"
      tabIndex={0}
      aria-label={label}
      aria-valuemin={0}
      aria-valuemax={durationMs}
      aria-valuenow={ms}
      aria-valuetext={shortTime(ms)}
      style={{ left: `${(ms / durationMs) * 100}%` }}
      className="absolute inset-y-0 z-10 grid w-7 -translate-x-1/2 cursor-ew-resize touch-none place-items-center"
    >
      <span className="h-10 w-2.5 rounded border-[1.5px] border-strong bg-chalk" />
    </span>
  );
}
