"use client";

import { useEffect, useMemo, useRef, useState, useSyncExternalStore } from "react";
import type { Media } from "@/lib/schemas/media";

type FilmProps = { media: Media; title: string; isFailed: boolean; onStale: () => void };

/** The film as it will be learned from, with the browser's own controls. `onStale` asks for fresh addresses when these have run out. */
export function Film({ media, title, isFailed, onStale }: FilmProps) {
  const video = useRef<HTMLVideoElement>(null);
  const at = useRef(0);
  // Whoever began to watch the first film that was made is not thrown back when the larger one is.
  const [size] = useState(media.p720 ? ("p720" as const) : ("p480" as const));
  const source = media[size];
  const tracks = useTracks(media.captions);
  useEffect(() => {
    // A new address begins at the beginning; whoever was watching goes on where they were.
    if (video.current && at.current > 0) video.current.currentTime = at.current;
  }, [source]);
  if (!source) {
    return (
      <div className="grid aspect-video place-items-center rounded bg-film px-6 text-center text-deep-soft">
        <p>{isFailed ? "There is no film to play." : "The film can be played here as soon as it is made."}</p>
      </div>
    );
  }
  return (
    <video
      ref={video}
      controls
      playsInline
      preload="metadata"
      src={source}
      aria-label={title}
      className="max-h-[70dvh] w-full rounded bg-film"
      {...(media.poster ? { poster: media.poster } : {})}
      onTimeUpdate={(event) => (at.current = event.currentTarget.currentTime)}
      onError={onStale}
      onStalled={onStale}
    >
      {tracks.map((track) => (
        <track key={track.language} kind="captions" srcLang={track.language} label={`Captions (${track.language})`} src={track.url} />
      ))}
    </video>
  );
}

/** Captions as addresses of this page's own: a track from another origin would need the film to be asked for in another way. */
function useTracks(captions: Media["captions"]): { language: string; url: string }[] {
  const text = JSON.stringify(captions);
  const isInBrowser = useSyncExternalStore(subscribeToNothing, () => true, () => false);
  const tracks = useMemo(() => {
    if (!isInBrowser) return [];
    return (JSON.parse(text) as Media["captions"]).map(({ language, vtt }) => ({
      language,
      url: URL.createObjectURL(new Blob([vtt], { type: "text/vtt" })),
    }));
  }, [text, isInBrowser]);
  useEffect(() => () => tracks.forEach(({ url }) => URL.revokeObjectURL(url)), [tracks]);
  return tracks;
}

const subscribeToNothing = () => () => {};
