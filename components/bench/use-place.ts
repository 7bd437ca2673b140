"use client";

import { useCallback, useEffect, useRef, useState } from "react";

/** The film on the bench: where it stands in ms, moved picture by picture while it plays. */
export function usePlace(durationMs: number) {
  const video = useRef<HTMLVideoElement>(null);
  const [atMs, setAtMs] = useState(0);
  const [playing, setPlaying] = useState(false);

  useEffect(() => {
    if (!playing) return;
    let frame = 0;
    const follow = () => {
      if (video.current) setAtMs(Math.round(video.current.currentTime * 1000));
      frame = requestAnimationFrame(follow);
    };
    frame = requestAnimationFrame(follow);
    return () => cancelAnimationFrame(frame);
  }, [playing]);

  const seek = useCallback(
    (ms: number) => {
      const to = Math.min(Math.max(Math.round(ms), 0), durationMs);
      if (video.current) video.current.currentTime = to / 1000;
      setAtMs(to);
    },
    [durationMs],
  );
  const toggle = useCallback(() => {
    const element = video.current;
    if (!element) return;
    if (element.paused) void element.play().catch(() => undefined);
    else element.pause();
  }, []);
  const handlers = { onPlay: () => setPlaying(true), onPause: () => setPlaying(false) };
  return { video, atMs, playing, seek, toggle, handlers };
}
