"use client";

import type { Chosen } from "@/components/bench/chosen";
import { useEffect, useRef, useState, type ReactNode } from "react";
import type { BenchAct, Draft } from "@/components/bench/bench-state";
import { CaptionLane } from "@/components/bench/caption-lane";
import { PictureLane, type Storyboard } from "@/components/bench/picture-lane";
import { QuestionLane } from "@/components/bench/question-lane";
import { StepLane } from "@/components/bench/step-lane";
import { shortTime } from "@/components/bench/time-field";
import { useDrag } from "@/components/bench/use-drag";
import { formatClock } from "@/lib/core/webvtt/timestamps";


type RulerProps = {
  durationMs: number;
  atMs: number;
  zoom: number;
  draft: Draft;
  captions: { startMs: number; endMs: number; text: string }[];
  storyboard: Storyboard | null;
  chosen: Chosen;
  onSeek: (ms: number) => void;
  onChoose: (chosen: Chosen) => void;
  act: (act: BenchAct) => void;
  /** Told once: how wide the ruler's place on the page is. */
  onRoom: (px: number) => void;
};

/** One ruler for everything on the bench: time, pictures, steps, questions, captions. */
export function Ruler(props: RulerProps) {
  const { durationMs, atMs, zoom, draft, captions, chosen, onRoom } = props;
  const scroller = useRef<HTMLDivElement>(null);
  const [seen, setSeen] = useState(0);
  const percent = (ms: number) => `${(ms / durationMs) * 100}%`;

  useEffect(() => {
    const element = scroller.current;
    if (!element) return;
    let told = false;
    const watch = new ResizeObserver(() => {
      setSeen(element.clientWidth);
      if (!told) onRoom(element.clientWidth);
      told = true;
    });
    watch.observe(element);
    return () => watch.disconnect();
  }, [onRoom]);

  // Zoomed in, the place of the film stays in sight.
  useEffect(() => {
    const element = scroller.current;
    if (!element || zoom === 1) return;
    const x = (atMs / durationMs) * element.scrollWidth;
    if (x < element.scrollLeft + 24 || x > element.scrollLeft + element.clientWidth - 24) element.scrollLeft = x - element.clientWidth / 3;
  }, [atMs, durationMs, zoom]);

  return (
    <div className="grid grid-cols-[4.75rem_minmax(0,1fr)] border-b border-rule bg-chalk sm:grid-cols-[6.5rem_minmax(0,1fr)]">
      <div className="border-r-2 border-steel bg-enamel font-plate text-[0.95rem] font-semibold leading-none text-ink2 sm:text-[1.05rem]" aria-hidden>
        <LaneName className="h-9">Time</LaneName>
        <LaneName className="h-13">Picture</LaneName>
        <LaneName className="h-14">Steps</LaneName>
        <LaneName className="h-15">Questions</LaneName>
        <LaneName className="h-10">Captions</LaneName>
      </div>
      <div ref={scroller} className="relative overflow-x-auto overflow-y-hidden [scrollbar-width:thin]">
        <div className="relative" style={{ width: `${zoom * 100}%` }}>
          <Scrubber durationMs={durationMs} atMs={atMs} onSeek={props.onSeek}>
            <Ticks durationMs={durationMs} widthPx={seen * zoom} />
            <PictureLane storyboard={props.storyboard} durationMs={durationMs} widthPx={seen * zoom} />
          </Scrubber>
          <StepLane durationMs={durationMs} atMs={atMs} steps={draft.steps} chosen={chosen} onSeek={props.onSeek} onChoose={props.onChoose} act={props.act} />
          <QuestionLane durationMs={durationMs} widthPx={seen * zoom} questions={draft.questions} chosen={chosen} onChoose={props.onChoose} />
          <CaptionLane durationMs={durationMs} widthPx={seen * zoom} atMs={atMs} captions={captions} />
          <span aria-hidden className="pointer-events-none absolute inset-y-0 z-20 -ml-px w-0.5 bg-line" style={{ left: percent(atMs) }}>
            <span className="absolute -left-[5px] top-0 border-x-6 border-t-8 border-x-transparent border-t-line" />
          </span>
        </div>
      </div>
    </div>
  );
}

const LaneName = ({ children, className }: { children: ReactNode; className: string }) => (
  <p className={`flex items-center border-b border-rule px-2 last:border-b-0 sm:px-3 ${className}`}>{children}</p>
);

type ScrubberProps = { durationMs: number; atMs: number; onSeek: (ms: number) => void; children: ReactNode };

/** Time and pictures: pressed or dragged, the film follows. By keyboard the bench's own keys move it. */
function Scrubber({ durationMs, atMs, onSeek, children }: ScrubberProps) {
  const element = useRef<HTMLDivElement>(null);
  const drag = useDrag(
    () => element.current?.getBoundingClientRect(),
    (share) => onSeek(share * durationMs),
  );
  return (
    <div
      ref={element}
      {...drag}
      role="slider"
      tabIndex={0}
      aria-label="Place in the film"
      aria-valuemin={0}
      aria-valuemax={durationMs}
      aria-valuenow={atMs}
      aria-valuetext={shortTime(atMs)}
      className="cursor-ew-resize touch-pan-x select-none -outline-offset-3"
    >
      {children}
    </div>
  );
}

/** Distances of ticks that read well, in ms. */
const TICKS = [1000, 2000, 5000, 10_000, 15_000, 30_000, 60_000, 120_000, 300_000, 600_000, 1_800_000];
const ROOM_PX = 64;

function Ticks({ durationMs, widthPx }: { durationMs: number; widthPx: number }) {
  const every = TICKS.find((distance) => (distance / durationMs) * widthPx >= ROOM_PX) ?? 3_600_000;
  const small = every / 5;
  const count = Math.floor(durationMs / small);
  return (
    <div className="relative h-9 overflow-hidden border-b border-rule">
      {widthPx > 0 &&
        Array.from({ length: count + 1 }, (_, index) => {
          const whole = index % 5 === 0;
          return (
            <span
              key={index}
              className={`tabular absolute bottom-0 whitespace-nowrap border-l border-steel font-mono text-[0.75rem] leading-none text-ink2 ${whole ? "h-full pl-1 pt-1.5" : "h-2"}`}
              style={{ left: `${((index * small) / durationMs) * 100}%` }}
            >
              {whole && formatClock(index * small)}
            </span>
          );
        })}
    </div>
  );
}
