"use client";

import { useCallback, useEffect, useRef, useState } from "react";

/** How fast the film runs while J or L is held: seconds of film a second, faster the longer. */
const SHUTTLE_RATES = [2, 4, 8] as const;
const FASTER_AFTER_MS = 1500;

/** The film on the bench: where it stands in ms, moved picture by picture while it plays. */
export function usePlace(durationMs: number) {
  const video = useRef<HTMLVideoElement>(null);
  const [atMs, setAtMs] = useState(0);
  const [playing, setPlaying] = useState(false);
  const at = useRef(0);
  const shuttling = useRef<{ direction: 1 | -1; frame: number; played: boolean } | null>(null);

  const move = useCallback((ms: number) => {
    at.current = ms;
    setAtMs(ms);
  }, []);

  useEffect(() => {
    if (!playing) return;
    let frame = 0;
    const follow = () => {
      if (video.current && !shuttling.current) move(Math.round(video.current.currentTime * 1000));
      frame = requestAnimationFrame(follow);
    };
    frame = requestAnimationFrame(follow);
    return () => cancelAnimationFrame(frame);
  }, [move, playing]);

  const seek = useCallback(
    (ms: number) => {
      const to = Math.min(Math.max(Math.round(ms), 0), durationMs);
      if (video.current) video.current.currentTime = to / 1000;
      move(to);
    },
    [durationMs, move],
  );
  /** On or back from where the film stands now. */
  const step = useCallback((byMs: number) => seek(at.current + byMs), [seek]);
  const toggle = useCallback(() => {
    const element = video.current;
    if (!element) return;
    if (element.paused) void element.play().catch(() => undefined);
    else element.pause();
  }, []);

  /** Runs the film fast either way. Browsers can't play backwards, so it is led along picture by picture. */
  const shuttle = useCallback(
    (direction: 1 | -1) => {
      const element = video.current;
      if (!element || shuttling.current) return;
      const began = performance.now();
      let before = began;
      const played = !element.paused;
      element.pause();
      const run = (now: number) => {
        const rate = SHUTTLE_RATES[Math.min(Math.floor((now - began) / FASTER_AFTER_MS), SHUTTLE_RATES.length - 1)] ?? 2;
        const to = Math.min(Math.max(at.current + direction * rate * (now - before), 0), durationMs);
        before = now;
        move(Math.round(to));
        // A seek that is still under way is not overtaken, or no picture would ever show.
        if (!element.seeking) element.currentTime = to / 1000;
        if (shuttling.current) shuttling.current.frame = requestAnimationFrame(run);
      };
      shuttling.current = { direction, played, frame: requestAnimationFrame(run) };
    },
    [durationMs, move],
  );
  const stopShuttle = useCallback(() => {
    const run = shuttling.current;
    if (!run) return;
    cancelAnimationFrame(run.frame);
    shuttling.current = null;
    seek(at.current);
    if (run.played) void video.current?.play().catch(() => undefined);
  }, [seek]);

  const handlers = { onPlay: () => setPlaying(true), onPause: () => setPlaying(false) };
  return { video, atMs, playing, seek, step, toggle, shuttle, stopShuttle, handlers };
}
