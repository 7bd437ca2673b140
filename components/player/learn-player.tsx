"use client";

import "@/components/player/film.css";
import { useCallback, useEffect, useMemo, useRef, useState } from "react";
import { api } from "@/components/api/client";
import { FilmControls } from "@/components/player/film-controls";
import { LearnSide } from "@/components/player/learn-side";
import { reachIn } from "@/components/player/reach";
import { SpanRecorder } from "@/components/player/span-recorder";
import { heldBack, nextStop, type Stop } from "@/components/player/stops";
import { useFilm, type Film } from "@/components/player/use-film";
import { useReport } from "@/components/player/use-report";
import { unionSpans, type Span } from "@/lib/core/coverage/spans";
import type { ModuleStep } from "@/lib/core/modules/types";
import type { LearningProgress, MarkedAnswer } from "@/lib/schemas/assignments";

export type LearnPlayerProps = {
  params: { org: string; assignmentId: string };
  steps: ModuleStep[];
  questions: { id: string; stepId: string; recordingId: string; atMs: number; right: boolean }[];
  progress: LearningProgress;
  media: { recordingId: string; p480: string | null; p720: string | null; poster: string | null; captions: { startMs: number; endMs: number; text: string }[] }[];
};

/** A picture may be shown this much before a stop without being wrong: half a frame at 25 a second. */
const HALF_FRAME_MS = 20;

/** Plays a module step by step: stops at cautions and questions, holds back what was not seen, and tells the server what was played. */
export function LearnPlayer({ params, steps, questions, progress: first, media }: LearnPlayerProps) {
  const [progress, setProgress] = useState(first);
  const [stepIndex, setStepIndex] = useState(0);
  const [atMs, setAtMs] = useState(steps[0]?.startMs ?? 0);
  const [stop, setStop] = useState<Stop | null>(null);
  const [rate, setRate] = useState(1);
  const [captionsOn, setCaptionsOn] = useState(true);
  const [done, setDone] = useState<ReadonlySet<string>>(() => new Set(questions.filter((question) => question.right).map((question) => question.id)));
  const [recorder] = useState(() => new SpanRecorder());
  const frame = useRef<HTMLDivElement>(null);

  const step = steps[stepIndex];
  const recordingId = step?.recordingId ?? "";
  const stops = useMemo(() => stopsOf(steps, questions), [steps, questions]);
  const live = useRef({ stepIndex, recordingId, stop, done, progress, rate });
  useEffect(() => {
    live.current = { stepIndex, recordingId, stop, done, progress, rate };
  });

  const send = useReport({
    params,
    recorder,
    recordingId: useCallback(() => live.current.recordingId, []),
    rate: useCallback(() => live.current.rate, []),
    onProgress: setProgress,
  });

  const onLook = useCallback(
    (now: number, film: Film) => {
      const { stop: held, done: dealtWith, recordingId: playing, stepIndex: index, progress: known } = live.current;
      if (held) return film.pause();
      recorder.look(now, !film.paused() && !document.hidden);
      const here = stops.filter((candidate) => candidate.recordingId === playing);
      const ahead = nextStop(here, dealtWith, 0);
      const reach = known.knowledge.met ? Number.POSITIVE_INFINITY : reachIn(playing, steps, playedSoFar(known, playing, recorder.pending()));
      if (ahead && now >= ahead.atMs - HALF_FRAME_MS) {
        film.pause();
        if (now > ahead.atMs + 2 * HALF_FRAME_MS) film.seek(ahead.atMs);
        setStop(ahead);
        void send();
      } else if (now > reach + HALF_FRAME_MS) {
        film.seek(heldBack(now, reach, ahead));
      }
      const inside = steps.findIndex((candidate) => candidate.recordingId === playing && now >= candidate.startMs && now < candidate.endMs);
      if (inside !== -1 && inside !== index) setStepIndex(inside);
      else if (inside === -1 && !film.paused() && now >= (steps[index]?.endMs ?? 0)) film.pause();
      setAtMs(now);
    },
    [recorder, send, steps, stops],
  );

  const renew = useCallback(async () => {
    const { media: fresh } = await api("GET /orgs/{org}/assignments/{assignmentId}/media", { params });
    return sourceOf(fresh, live.current.recordingId);
  }, [params]);
  const { holder, state, withFilm } = useFilm({ onLook, renew });

  const playable = sourceOf(media, recordingId);
  useEffect(() => {
    if (state.ready && playable) {
      withFilm((film) => film.load(playable, media.find((files) => files.recordingId === recordingId)?.poster ?? null, steps[live.current.stepIndex]?.startMs ?? 0));
    }
    // The address alone must not load the film again: it is renewed where it is used.
    // eslint-disable-next-line react-hooks/exhaustive-deps -- only another recording or the player's arrival loads a film
  }, [state.ready, recordingId]);

  const toggle = () => {
    if (stop) return;
    withFilm((film) => {
      if (film.paused()) {
        // Starts the server's clock, so that what is played from here on counts.
        void send(true);
        film.play();
      } else {
        film.pause();
        void send();
      }
    });
  };
  const seek = (ms: number) => withFilm((film) => film.seek(ms));
  const enter = (index: number) => {
    const target = steps[index];
    if (!target) return;
    setStop(null);
    setStepIndex(index);
    if (target.recordingId === recordingId) seek(target.startMs);
  };
  const goOn = (dealtWith: string) => {
    setDone((before) => new Set(before).add(dealtWith));
    setStop(null);
    void send(true);
    setTimeout(() => withFilm((film) => film.play()), 0);
  };
  const onMarked = (marked: MarkedAnswer) => setProgress((before) => ({ ...before, knowledge: marked.knowledge }));

  const caption = captionsOn ? media.find((files) => files.recordingId === recordingId)?.captions.find((cue) => atMs >= cue.startMs && atMs < cue.endMs) : undefined;
  return (
    <div className="grid items-start gap-4 lg:grid-cols-[minmax(0,1fr)_25rem]">
      <div ref={frame} className="overflow-hidden rounded border border-rule bg-film">
        <div className="relative aspect-video">
          <div ref={holder} className="absolute inset-0 [&_.video-js]:h-full [&_.video-js]:w-full" onClick={toggle} />
          {caption && (
            <p className="pointer-events-none absolute inset-x-4 bottom-3 mx-auto w-fit max-w-[46ch] bg-film/85 px-3 py-1 text-center text-[1.1rem] text-[#fff]">
              {caption.text}
            </p>
          )}
          {!playable && <p className="absolute inset-0 grid place-items-center p-6 text-center text-[#fff]">This film isn’t there to be played right now. Ask the mentor who gave it.</p>}
        </div>
        <FilmControls
          playing={state.playing}
          atMs={atMs}
          startMs={step?.startMs ?? 0}
          endMs={step?.endMs ?? 0}
          rate={rate}
          captionsOn={captionsOn}
          onToggle={toggle}
          onSeek={seek}
          onRate={(value) => {
            // What was played so far is told at the rate at which it was played.
            void send();
            setRate(value);
            withFilm((film) => film.setRate(value));
          }}
          onCaptions={setCaptionsOn}
          onFullScreen={() => void frame.current?.requestFullscreen?.()}
        />
      </div>
      <LearnSide
        params={params}
        steps={steps}
        stepIndex={stepIndex}
        progress={progress}
        stop={stop}
        onEnter={enter}
        onGoOn={goOn}
        onMarked={onMarked}
        onLookAgain={(ms) => {
          setStop(null);
          setTimeout(() =>
            withFilm((film) => {
              film.seek(ms);
              film.play();
            }),
          );
        }}
      />
    </div>
  );
}

type PlacedStop = Stop & { recordingId: string };

/** Every caution before its step and every question at its moment. */
function stopsOf(steps: ModuleStep[], questions: LearnPlayerProps["questions"]): PlacedStop[] {
  const cautions = steps
    .filter((step) => step.facts.cautions.length > 0)
    .map((step): PlacedStop => ({ kind: "caution", id: `caution ${step.id}`, atMs: step.startMs, recordingId: step.recordingId }));
  return [...cautions, ...questions.map(({ id, atMs, recordingId }): PlacedStop => ({ kind: "question", id, atMs, recordingId }))];
}

const sourceOf = (media: { recordingId: string; p480: string | null; p720: string | null }[], recordingId: string): string | null => {
  const files = media.find((candidate) => candidate.recordingId === recordingId);
  return files?.p720 ?? files?.p480 ?? null;
};

/** What the server accepted, and what was played since and is on its way. */
function playedSoFar(progress: LearningProgress, recordingId: string, pending: Span[]): Map<string, Span[]> {
  const played = new Map<string, Span[]>(Object.entries(progress.played));
  played.set(recordingId, unionSpans([...(played.get(recordingId) ?? []), ...pending]));
  return played;
}
