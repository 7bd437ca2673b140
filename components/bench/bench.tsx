"use client";

import { useCallback, useReducer, useState } from "react";
import { beginBench, bench, stepAt, type BenchAct, type Draft } from "@/components/bench/bench-state";
import { BenchSide } from "@/components/bench/bench-side";
import { BENCH_KEYS } from "@/components/bench/keys";
import { emptyBody } from "@/components/bench/question-editor";
import { Ruler, type Chosen } from "@/components/bench/ruler";
import { SavedLine } from "@/components/bench/saved-line";
import { useBenchKeys } from "@/components/bench/use-bench-keys";
import { usePlace } from "@/components/bench/use-place";
import { useSaving } from "@/components/bench/use-saving";
import { VttPanel } from "@/components/bench/vtt-panel";
import { api } from "@/components/api/client";
import { Button } from "@/components/ui/button";
import { Dialog } from "@/components/ui/dialog";
import { Notice } from "@/components/ui/notice";
import { KeyCap } from "@/components/ui/tag";
import type { Question } from "@/lib/core/questions/types";
import { formatClock } from "@/lib/core/webvtt/timestamps";

export type BenchProps = {
  params: { org: string; recordingId: string };
  durationMs: number;
  version: number;
  first: Draft;
  source: string | null;
  poster: string | null;
  captions: { startMs: number; endMs: number; text: string }[];
  storyboard: { sheet: string; tiles: { startMs: number; endMs: number; x: number; y: number; width: number; height: number }[] } | null;
};

const ZOOMS = [1, 2, 4, 8, 16] as const;
const RATES = [0.5, 1, 1.5, 2] as const;
/** One picture of a film at 25 a second. */
const PICTURE_MS = 40;

/** The bench: picture on top, one ruler under it, what is chosen beside it. Every act has a key and a button. */
export function Bench(props: BenchProps) {
  const { params, durationMs } = props;
  const [state, act] = useReducer(bench, props.first, beginBench);
  const { steps, questions } = state.draft;
  const [chosen, setChosen] = useState<Chosen>(null);
  const [zoom, setZoom] = useState(1);
  const [dialog, setDialog] = useState<"keys" | "files" | null>(null);
  const { video, atMs, playing, seek, toggle, handlers } = usePlace(durationMs);
  const saving = useSaving(params, state.draft, props.version);

  const here = stepAt(steps, atMs);
  const chosenStepId = chosen?.kind === "step" ? chosen.id : questions.find((question) => question.id === chosen?.id)?.stepId;
  const current = steps.find((step) => step.id === chosenStepId) ?? here;
  const choose = useCallback(
    (next: Chosen) => {
      setChosen(next);
      const at = next?.kind === "step" ? steps.find((step) => step.id === next.id)?.startMs : questions.find((question) => question.id === next?.id)?.atMs;
      if (at !== undefined) seek(at);
    },
    [questions, seek, steps],
  );
  const withNew = (make: (newId: string) => BenchAct) => {
    const newId = crypto.randomUUID();
    act(make(newId));
    setChosen({ kind: "step", id: newId });
  };
  const ask = () => {
    const step = here ?? current;
    if (!step) return;
    const at = Math.min(Math.max(atMs, step.startMs), step.endMs);
    const question: Question = { id: crypto.randomUUID(), stepId: step.id, atMs: at, prompt: "", explanation: "", lookAgainMs: step.startMs, safetyCritical: false, body: emptyBody("one_of") };
    act({ do: "put_question", question });
    setChosen({ kind: "question", id: question.id });
    video.current?.pause();
  };
  const remove = () => {
    if (chosen?.kind === "step") act({ do: "remove_step", stepId: chosen.id });
    if (chosen?.kind === "question") act({ do: "remove_question", questionId: chosen.id });
    setChosen(null);
  };
  const neighbour = (by: -1 | 1) => {
    const index = current ? steps.findIndex((step) => step.id === current.id) : -1;
    const next = steps[index + by];
    if (next) choose({ kind: "step", id: next.id });
  };
  const split = () => withNew((newId) => ({ do: "split", atMs, newId }));
  const add = () => withNew((newId) => ({ do: "add", atMs, newId, durationMs }));

  useBenchKeys({
    " ": toggle,
    k: toggle,
    j: () => seek(atMs - 5000),
    l: () => seek(atMs + 5000),
    ArrowLeft: () => seek(atMs - 1000),
    ArrowRight: () => seek(atMs + 1000),
    ",": () => seek(atMs - PICTURE_MS),
    ".": () => seek(atMs + PICTURE_MS),
    "[": () => neighbour(-1),
    "]": () => neighbour(1),
    n: add,
    s: split,
    i: () => current && act({ do: "set_start", stepId: current.id, atMs }),
    o: () => current && act({ do: "set_end", stepId: current.id, atMs, durationMs }),
    m: () => current && act({ do: "join", stepId: current.id }),
    q: ask,
    Delete: remove,
    "mod+z": () => act({ do: "undo" }),
    "mod+shift+z": () => act({ do: "redo" }),
    "?": () => setDialog("keys"),
  });

  const loadTheirs = async () => {
    const theirs = await api("GET /orgs/{org}/recordings/{recordingId}/marking", { params });
    const draft = { steps: theirs.steps, questions: theirs.questions };
    act({ do: "load", draft });
    saving.settle(draft, theirs.version);
  };

  return (
    <div className="grid lg:grid-cols-[minmax(0,1fr)_25rem]">
      <div className="min-w-0">
        <div className="bg-film">
          {props.source ? (
            <video ref={video} src={props.source} poster={props.poster ?? undefined} preload="auto" playsInline onClick={toggle} {...handlers} className="mx-auto block aspect-video max-h-[52dvh] w-full" />
          ) : (
            <p className="grid aspect-video max-h-[52dvh] w-full place-items-center p-6 text-center text-[#fff]">The film is still being prepared. Steps can be set when it plays.</p>
          )}
        </div>
        <div data-on-deep className="flex flex-wrap items-center gap-x-4 gap-y-1 bg-deep px-3 py-1.5 text-deep-ink">
          <button type="button" onClick={toggle} className="min-h-11 min-w-16 font-plate text-[1.15rem] font-semibold">
            {playing ? "Pause" : "Play"}
          </button>
          <span className="tabular font-mono">
            {formatClock(atMs)}.{String(Math.floor((atMs % 1000) / 10)).padStart(2, "0")} <span className="text-deep-soft">/ {formatClock(durationMs)}</span>
          </span>
          <label className="flex items-center gap-2">
            <span className="sr-only">Rate</span>
            <select className="min-h-11 rounded bg-deep font-mono" defaultValue={1} onChange={(event) => video.current && (video.current.playbackRate = Number(event.target.value))}>
              {RATES.map((rate) => (
                <option key={rate} value={rate}>
                  {rate}×
                </option>
              ))}
            </select>
          </label>
          <label className="flex items-center gap-2">
            <span className="sr-only">Zoom of the ruler</span>
            <select className="min-h-11 rounded bg-deep font-mono" value={zoom} onChange={(event) => setZoom(Number(event.target.value))}>
              {ZOOMS.map((value) => (
                <option key={value} value={value}>
                  {value === 1 ? "whole film" : `zoom ${value}`}
                </option>
              ))}
            </select>
          </label>
          <span className="ml-auto text-deep-soft">
            <SavedLine state={saving.state} />
          </span>
        </div>
        <Ruler
          durationMs={durationMs}
          atMs={atMs}
          zoom={zoom}
          steps={steps}
          questions={questions}
          captions={props.captions}
          storyboard={props.storyboard}
          chosen={chosen}
          onSeek={seek}
          onChoose={choose}
        />
        <div className="flex flex-wrap gap-2 px-3 py-3">
          <Button kind={here ? "plain" : "main"} onClick={add} disabled={here !== undefined}>
            <KeyCap>N</KeyCap> New step
          </Button>
          <Button onClick={split} disabled={here === undefined}>
            <KeyCap>S</KeyCap> Split here
          </Button>
          <Button onClick={ask} disabled={current === undefined}>
            <KeyCap>Q</KeyCap> Question here
          </Button>
          <Button onClick={() => act({ do: "undo" })} disabled={state.undo.length === 0}>
            Undo
          </Button>
          <Button onClick={() => act({ do: "redo" })} disabled={state.redo.length === 0}>
            Redo
          </Button>
          <Button onClick={() => setDialog("files")}>WebVTT files</Button>
          <Button onClick={() => setDialog("keys")}>
            <KeyCap>?</KeyCap> All keys
          </Button>
        </div>
        <div className="grid gap-3 px-3 pb-4">
          {saving.state.kind === "conflict" && (
            <Notice kind="error" title="Somebody else saved this marking out meanwhile.">
              <p>Yours is kept on this device and still on this page. Loading theirs replaces it here.</p>
              <Button onClick={() => void loadTheirs()}>Load theirs</Button>
            </Notice>
          )}
          {saving.state.kind === "refused" && (
            <Notice kind="error" title={saving.state.message}>
              <ul className="list-disc pl-5">
                {saving.state.problems.map((problem) => (
                  <li key={`${problem.path} ${problem.message}`}>{problem.message}</li>
                ))}
              </ul>
            </Notice>
          )}
        </div>
      </div>
      <BenchSide chosen={chosen} current={current} draft={state.draft} atMs={atMs} durationMs={durationMs} act={act} onRemoved={() => setChosen(null)} />
      <Dialog open={dialog === "keys"} onClose={() => setDialog(null)} title="Keys of the bench">
        <dl className="grid grid-cols-[8rem_1fr] gap-y-2">
          {BENCH_KEYS.map(({ key, words }) => (
            <div key={key} className="contents">
              <dt>
                <KeyCap>{key}</KeyCap>
              </dt>
              <dd>{words}</dd>
            </div>
          ))}
        </dl>
      </Dialog>
      <Dialog open={dialog === "files"} onClose={() => setDialog(null)} title="WebVTT files">
        <VttPanel
          params={params}
          version={saving.version}
          onImported={(draft, version) => {
            act({ do: "load", draft });
            saving.settle(draft, version);
            setChosen(null);
          }}
        />
      </Dialog>
    </div>
  );
}
