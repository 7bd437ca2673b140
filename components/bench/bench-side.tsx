"use client";

import type { BenchAct, Draft } from "@/components/bench/bench-state";
import { QuestionEditor } from "@/components/bench/question-editor";
import type { Chosen } from "@/components/bench/ruler";
import { StepEditor } from "@/components/bench/step-editor";
import { KeyCap } from "@/components/ui/tag";
import type { Step } from "@/lib/core/steps/types";

type BenchSideProps = {
  chosen: Chosen;
  current: Step | undefined;
  draft: Draft;
  atMs: number;
  durationMs: number;
  act: (act: BenchAct) => void;
  onRemoved: () => void;
};

/** What is chosen, or how to begin. */
export function BenchSide({ chosen, current, draft, atMs, durationMs, act, onRemoved }: BenchSideProps) {
  const question = chosen?.kind === "question" ? draft.questions.find((candidate) => candidate.id === chosen.id) : undefined;
  return (
    <aside aria-label="What is chosen" className="border-rule bg-sheet px-4 pb-28 pt-4 max-lg:border-t-2 lg:border-l-2 lg:pb-8">
      {question && (
        <QuestionEditor
          key={question.id}
          question={question}
          number={draft.questions.indexOf(question) + 1}
          step={draft.steps.find((step) => step.id === question.stepId)}
          steps={draft.steps}
          atMs={atMs}
          onChange={(next) => act({ do: "put_question", question: next })}
          onRemove={() => {
            act({ do: "remove_question", questionId: question.id });
            onRemoved();
          }}
        />
      )}
      {!question && current && <StepEditor key={current.id} step={current} number={draft.steps.indexOf(current) + 1} atMs={atMs} durationMs={durationMs} act={act} />}
      {!question && !current && (
        <div className="grid gap-2 text-ink2">
          <p className="font-plate text-[1.3rem] font-semibold text-ink">Nothing is marked out here yet</p>
          <p>
            Play to where a step begins and press <KeyCap>N</KeyCap>. Where the next one begins, press <KeyCap>S</KeyCap>. Ask a question with <KeyCap>Q</KeyCap>.
          </p>
        </div>
      )}
    </aside>
  );
}
