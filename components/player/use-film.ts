"use client";

import { useCallback, useEffect, useRef, useState } from "react";
import type Player from "video.js/dist/types/player";

type FilmOptions = {
  /** Called about as often as pictures are shown while playing, and after each seek. */
  onLook: (atMs: number, film: Film) => void;
  /** Called when the address has run out or the store can't be reached; may give a new address. */
  renew: () => Promise<string | null>;
};

/** What the page can do with the film. Times in ms. */
export type Film = {
  play: () => void;
  pause: () => void;
  seek: (ms: number) => void;
  setRate: (rate: number) => void;
  load: (source: string, poster: string | null, atMs: number) => void;
  rate: () => number;
  atMs: () => number;
  paused: () => boolean;
};

/** How often to look where no picture callback exists, and while the page is in the background. */
const LOOK_EVERY_MS = 40;

/** The player without controls of its own, made when the element is there and taken down with it. */
export function useFilm({ onLook, renew }: FilmOptions) {
  const holder = useRef<HTMLDivElement>(null);
  const player = useRef<Player | null>(null);
  const callbacks = useRef({ onLook, renew });
  useEffect(() => {
    callbacks.current = { onLook, renew };
  });
  const [state, setState] = useState({ ready: false, playing: false, waiting: false, durationMs: 0 });
  const film = useRef<Film | null>(null);

  useEffect(() => {
    let stopped = false;
    let timer: ReturnType<typeof setInterval> | undefined;
    void loadPlayer().then((videojs) => {
      if (stopped || !holder.current) return;
      const element = document.createElement("video-js");
      holder.current.append(element);
      const made = videojs(element, { controls: false, fill: true, preload: "auto", playsinline: true, loadingSpinner: false });
      player.current = made;
      const handle = filmOf(made);
      film.current = handle;
      const look = () => callbacks.current.onLook(handle.atMs(), handle);
      const video = made.el().querySelector("video");
      const everyPicture = () => {
        look();
        if (!stopped) video?.requestVideoFrameCallback?.(everyPicture);
      };
      video?.requestVideoFrameCallback?.(everyPicture);
      timer = setInterval(() => !handle.paused() && look(), LOOK_EVERY_MS);
      const patch = (change: Partial<typeof state>) => setState((before) => ({ ...before, ...change }));
      made.on("loadedmetadata", () => patch({ ready: true, durationMs: Math.round((made.duration() ?? 0) * 1000) }));
      made.on("play", () => patch({ playing: true }));
      made.on("pause", () => patch({ playing: false, waiting: false }));
      made.on("waiting", () => patch({ waiting: true }));
      made.on("playing", () => patch({ waiting: false }));
      made.on("seeking", look);
      made.on("timeupdate", look);
      made.on("error", () => void renewSource(made, callbacks.current.renew));
      setState((before) => ({ ...before, ready: true }));
    });
    return () => {
      stopped = true;
      clearInterval(timer);
      player.current?.dispose();
      player.current = null;
      film.current = null;
    };
  }, []);

  const withFilm = useCallback((act: (film: Film) => void) => {
    if (film.current) act(film.current);
  }, []);
  return { holder, state, withFilm, isReady: state.ready };
}

/** The player is loaded when a film is there to be played, not with the page. Its own style sheet is in our bundle: no injected styles. */
async function loadPlayer() {
  (window as { VIDEOJS_NO_DYNAMIC_STYLE?: boolean }).VIDEOJS_NO_DYNAMIC_STYLE = true;
  const { default: videojs } = await import("video.js/core");
  return videojs;
}

function filmOf(player: Player): Film {
  return {
    play: () => void player.play()?.catch(() => undefined),
    pause: () => player.pause(),
    seek: (ms) => void player.currentTime(ms / 1000),
    setRate: (rate) => void player.playbackRate(rate),
    load: (source, poster, atMs) => {
      if (poster) player.poster(poster);
      player.src({ src: source, type: "video/mp4" });
      if (atMs > 0) player.one("loadedmetadata", () => player.currentTime(atMs / 1000));
    },
    rate: () => player.playbackRate() ?? 1,
    atMs: () => Math.round((player.currentTime() ?? 0) * 1000),
    paused: () => player.paused(),
  };
}

/** Signed addresses run out. Ask for a new one and go on at the same place. */
async function renewSource(player: Player, renew: () => Promise<string | null>): Promise<void> {
  const at = player.currentTime() ?? 0;
  const source = await renew().catch(() => null);
  if (!source) return;
  player.error(null);
  player.src({ src: source, type: "video/mp4" });
  player.one("loadedmetadata", () => {
    player.currentTime(at);
    void player.play()?.catch(() => undefined);
  });
}
