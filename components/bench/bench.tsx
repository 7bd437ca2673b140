"use client";

import Link from "next/link";
import { useCallback, useReducer, useState, type MouseEvent } from "react";
import { BenchSide } from "@/components/bench/bench-side";
import { beginBench, bench, stepAt, type BenchAct, type Draft } from "@/components/bench/bench-state";
import { KeysSheet } from "@/components/bench/keys-sheet";
import type { Storyboard } from "@/components/bench/picture-lane";
import { emptyBody } from "@/components/bench/question-editor";
import type { Chosen } from "@/components/bench/chosen";
import { Ruler } from "@/components/bench/ruler";
import { SavedLine } from "@/components/bench/saved-line";
import { SavingNotices } from "@/components/bench/saving-notices";
import { Transport, ZOOMS } from "@/components/bench/transport";
import { useBenchKeys } from "@/components/bench/use-bench-keys";
import { usePlace } from "@/components/bench/use-place";
import { useSaving } from "@/components/bench/use-saving";
import { VttPanel } from "@/components/bench/vtt-panel";
import { Button } from "@/components/ui/button";
import { Dialog } from "@/components/ui/dialog";
import { KeyCap } from "@/components/ui/tag";
import type { MarkingView } from "@/lib/schemas/marking";

export type BenchProps = {
  params: { org: string; recordingId: string };
  title: string;
  back: string;
  film: {
    durationMs: number;
    marking: MarkingView;
    source: string | null;
    poster: string | null;
    captions: { startMs: number; endMs: number; text: string }[];
    storyboard: Storyboard | null;
  };
};

const SECOND_MS = 1000;
/** A second of film on the ruler at the least, when the bench opens: on a phone the whole film would be too fine to hit. */
const ROOMY_PX = 2;
/** One picture of a film at 25 a second. */
const PICTURE_MS = 40;

/** The bench: picture on top, one ruler under it, what is chosen beside it. Every act has a key and a button. */
export function Bench({ params, title, back, film }: BenchProps) {
  const { durationMs } = film;
  const [state, act] = useReducer(bench, film.marking, ({ steps, questions }) => beginBench({ steps, questions }));
  const { steps, questions } = state.draft;
  const [chosen, setChosen] = useState<Chosen>(null);
  const [zoom, setZoom] = useState(1);
  const [dialog, setDialog] = useState<"keys" | "files" | null>(null);
  const fit = useCallback((px: number) => setZoom(ZOOMS.find((candidate) => (px * candidate * SECOND_MS) / durationMs >= ROOMY_PX) ?? 1), [durationMs]);
  const place = usePlace(durationMs);
  const { video, atMs, seek, step: move } = place;
  const load = useCallback((draft: Draft) => {
    act({ do: "load", draft });
    setChosen(null);
  }, []);
  const saving = useSaving({ params, draft: state.draft, first: film.marking, load });

  const here = stepAt(steps, atMs);
  const chosenStepId = chosen?.kind === "step" ? chosen.id : questions.find((question) => question.id === chosen?.id)?.stepId;
  const current = steps.find((step) => step.id === chosenStepId) ?? here;
  const choose = (next: Chosen) => {
    setChosen(next);
    const at = next?.kind === "step" ? steps.find((step) => step.id === next.id)?.startMs : questions.find((question) => question.id === next?.id)?.atMs;
    if (at !== undefined) seek(at);
  };
  const withNew = (make: (newId: string) => BenchAct) => {
    const newId = crypto.randomUUID();
    act(make(newId));
    setChosen({ kind: "step", id: newId });
  };
  const split = () => here && withNew((newId) => ({ do: "split", atMs, newId }));
  const add = () => !here && withNew((newId) => ({ do: "add", atMs, newId, durationMs }));
  const ask = () => {
    if (!here) return;
    video.current?.pause();
    const id = crypto.randomUUID();
    const question = { id, stepId: here.id, atMs, prompt: "", explanation: "", lookAgainMs: here.startMs, safetyCritical: false, body: emptyBody("one_of") };
    act({ do: "put_question", question });
    setChosen({ kind: "question", id });
  };
  const remove = () => {
    if (chosen?.kind === "question") act({ do: "remove_question", questionId: chosen.id });
    else if (current) act({ do: "remove_step", stepId: current.id });
    setChosen(null);
  };
  const neighbour = (by: -1 | 1) => {
    const index = current ? steps.indexOf(current) + by : by === 1 ? steps.findIndex((step) => step.startMs > atMs) : steps.findLastIndex((step) => step.endMs <= atMs);
    const next = steps[index];
    if (next) choose({ kind: "step", id: next.id });
  };
  const undo = () => act({ do: "undo" });
  const redo = () => act({ do: "redo" });

  useBenchKeys(
    {
      " ": place.toggle,
      k: place.toggle,
      ArrowLeft: () => move(-SECOND_MS),
      ArrowRight: () => move(SECOND_MS),
      ",": () => move(-PICTURE_MS),
      ".": () => move(PICTURE_MS),
      Home: () => seek(0),
      End: () => seek(durationMs),
      "[": () => neighbour(-1),
      "]": () => neighbour(1),
      n: add,
      s: split,
      i: () => current && act({ do: "set_start", stepId: current.id, atMs }),
      o: () => current && act({ do: "set_end", stepId: current.id, atMs, durationMs }),
      m: () => current && act({ do: "join", stepId: current.id }),
      q: ask,
      Delete: () => chosen && remove(),
      Backspace: () => chosen && remove(),
      "mod+z": undo,
      "mod+shift+z": redo,
      "mod+y": redo,
      "?": () => setDialog("keys"),
    },
    {
      j: { press: () => move(-5 * SECOND_MS), hold: () => place.shuttle(-1), release: place.stopShuttle },
      l: { press: () => move(5 * SECOND_MS), hold: () => place.shuttle(1), release: place.stopShuttle },
    },
  );

  return (
    <main id="main" tabIndex={-1} className="isolate grid outline-none max-sm:[&_button_kbd]:hidden lg:grid-cols-[minmax(0,1fr)_26rem]">
      <div className="min-w-0" onMouseDown={keepFocusOffButtons}>
        <div className="flex flex-wrap items-center justify-between gap-x-5 px-3 py-1 sm:px-4">
          <h1 className="min-w-0 text-[1.35rem] leading-tight">
            <Link href={back} className="inline-flex min-h-11 items-center underline decoration-rule underline-offset-4">
              {title}
            </Link>
          </h1>
          <p className="text-ink2">
            <SavedLine state={saving.state} unfinished={saving.unfinished} />
          </p>
        </div>
        <div className="bg-film max-lg:sticky max-lg:top-0 max-lg:z-30">
          {film.source ? (
            <video
              ref={video}
              src={film.source}
              poster={film.poster ?? undefined}
              preload="auto"
              playsInline
              onClick={place.toggle}
              {...place.handlers}
              className="mx-auto block aspect-video max-h-[30dvh] w-full lg:max-h-[calc(100dvh-33rem)] lg:min-h-60"
            />
          ) : (
            <p className="mx-auto grid aspect-video max-h-[30dvh] w-full place-items-center p-6 text-center text-[#fff] lg:max-h-[calc(100dvh-33rem)]">
              The film is still being prepared. Times can be typed; it plays here as soon as it is ready.
            </p>
          )}
          <Transport
            atMs={atMs}
            durationMs={durationMs}
            playing={place.playing}
            zoom={zoom}
            onToggle={place.toggle}
            onStep={move}
            onRate={(rate) => {
              if (video.current) video.current.playbackRate = rate;
            }}
            onZoom={setZoom}
          />
        </div>
        <Ruler durationMs={durationMs} atMs={atMs} zoom={zoom} draft={state.draft} captions={film.captions} storyboard={film.storyboard} chosen={chosen} onSeek={seek} onChoose={choose} act={act} onRoom={fit} />
        <div className="flex flex-wrap gap-2 px-3 py-3 sm:px-4">
          {here ? (
            <Button onClick={split}>
              <KeyCap>S</KeyCap> Split here
            </Button>
          ) : (
            <Button kind={steps.length === 0 ? "main" : "plain"} onClick={add}>
              <KeyCap>N</KeyCap> New step here
            </Button>
          )}
          <Button onClick={ask} disabled={!here}>
            <KeyCap>Q</KeyCap> Question here
          </Button>
          <Button onClick={undo} disabled={state.undo.length === 0}>
            Undo
          </Button>
          <Button onClick={redo} disabled={state.redo.length === 0}>
            Redo
          </Button>
          <span className="flex flex-wrap gap-2 lg:ml-auto">
            <Button onClick={() => setDialog("files")}>WebVTT files</Button>
            <Button onClick={() => setDialog("keys")}>
              <KeyCap>?</KeyCap> All keys
            </Button>
          </span>
        </div>
        <div className="grid gap-3 px-3 pb-4 sm:px-4">
          <SavingNotices saving={saving} draft={state.draft} onChoose={choose} />
        </div>
      </div>
      <BenchSide chosen={chosen} current={current} draft={state.draft} atMs={atMs} durationMs={durationMs} act={act} onChoose={choose} onRemove={remove} />
      <Dialog open={dialog === "keys"} onClose={() => setDialog(null)} title="Keys of the bench">
        <KeysSheet />
      </Dialog>
      <Dialog open={dialog === "files"} onClose={() => setDialog(null)} title="WebVTT files">
        <VttPanel params={params} hasCaptions={film.captions.length > 0} version={saving.version} onImported={saving.settle} />
      </Dialog>
    </main>
  );
}

/** A button pressed by mouse or finger doesn't take the focus: the space bar goes on playing the film, not pressing it again. */
function keepFocusOffButtons(event: MouseEvent): void {
  if (!(event.target instanceof HTMLElement) || !event.target.closest("button")) return;
  event.preventDefault();
  if (document.activeElement instanceof HTMLElement) document.activeElement.blur();
}
