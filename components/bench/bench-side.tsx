"use client";

import { useRef } from "react";
import type { BenchAct, Draft } from "@/components/bench/bench-state";
import { QuestionEditor } from "@/components/bench/question-editor";
import type { Chosen } from "@/components/bench/chosen";
import { StepEditor } from "@/components/bench/step-editor";
import { shortTime } from "@/components/bench/time-field";
import { Button } from "@/components/ui/button";
import { KeyCap, Value } from "@/components/ui/tag";
import type { Step } from "@/lib/core/steps/types";

type BenchSideProps = {
  chosen: Chosen;
  current: Step | undefined;
  draft: Draft;
  atMs: number;
  durationMs: number;
  act: (act: BenchAct) => void;
  onChoose: (chosen: Chosen) => void;
  onRemove: () => void;
};

/** What is chosen, or how to begin. */
export function BenchSide({ chosen, current, draft, atMs, durationMs, act, onChoose, onRemove }: BenchSideProps) {
  const { steps, questions } = draft;
  const question = chosen?.kind === "question" ? questions.find((candidate) => candidate.id === chosen.id) : undefined;
  const number = current ? steps.indexOf(current) + 1 : 0;
  // What is typed in one visit to a field is one thing to undo.
  const visit = useRef(0);
  const visited = (edit: BenchAct) => act({ ...edit, strand: `visit ${visit.current}` });
  const begin = () => {
    visit.current += 1;
  };
  const go = (step: Step | undefined) => step && onChoose({ kind: "step", id: step.id });
  return (
    <aside
      aria-label="What is chosen"
      onFocus={begin}
      onClickCapture={begin}
      className="min-w-0 border-rule bg-sheet px-4 pb-28 pt-3 max-lg:border-t-2 lg:sticky lg:top-0 lg:max-h-dvh lg:min-h-[calc(100dvh-3.5rem)] lg:overflow-y-auto lg:border-l-2 lg:pb-8"
    >
      {current && (
        <div className="mb-3 flex items-center justify-between gap-2 border-b border-rule pb-3">
          <Button aria-label="The step before" disabled={number <= 1} onClick={() => go(steps[number - 2])}>
            <KeyCap>[</KeyCap>‹
          </Button>
          <h2 className="min-w-0 text-center text-[1.3rem] leading-tight">
            {question ? `Question ${questions.indexOf(question) + 1} of ${questions.length}` : `Step ${number} of ${steps.length}`}
            <span className="block font-sans text-sm font-normal text-ink2">
              {question ? `in step ${number}, ${current.title}` : <Value>{`${shortTime(current.startMs)} – ${shortTime(current.endMs)}`}</Value>}
            </span>
          </h2>
          <Button aria-label="The step after" disabled={number >= steps.length} onClick={() => go(steps[number])}>
            ›<KeyCap>]</KeyCap>
          </Button>
        </div>
      )}
      {question && (
        <QuestionEditor
          key={question.id}
          question={question}
          step={steps.find((step) => step.id === question.stepId)}
          steps={steps}
          atMs={atMs}
          onChange={(next) => visited({ do: "put_question", question: next })}
          onRemove={onRemove}
        />
      )}
      {!question && current && (
        <StepEditor key={current.id} step={current} isLast={number === steps.length} atMs={atMs} durationMs={durationMs} act={visited} onRemove={onRemove} />
      )}
      {!current && (
        <div className="grid gap-3 py-2">
          <h2 className="text-[1.4rem] leading-tight">{steps.length === 0 ? "No steps yet" : "No step here"}</h2>
          <ol className="grid gap-2 text-ink2">
            <li>
              <KeyCap>N</KeyCap> A new step from where the film stands.
            </li>
            <li>
              <KeyCap>S</KeyCap> Where the next one begins: split it there.
            </li>
            <li>
              <KeyCap>Q</KeyCap> A question at this moment.
            </li>
          </ol>
          {steps.length > 0 && <Button onClick={() => go(steps.findLast((step) => step.startMs <= atMs) ?? steps[0])}>Go to the nearest step</Button>}
        </div>
      )}
    </aside>
  );
}
