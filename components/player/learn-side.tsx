"use client";

import { QuestionPanel } from "@/components/player/question-panel";
import { StepFactsView } from "@/components/player/step-facts";
import type { Stop } from "@/components/player/stops";
import { Button } from "@/components/ui/button";
import { CautionPlate } from "@/components/ui/caution";
import { Value } from "@/components/ui/tag";
import { SEEN_SHARE } from "@/lib/core/modules/knowledge";
import type { ModuleStep } from "@/lib/core/modules/types";
import { formatClock } from "@/lib/core/webvtt/timestamps";
import type { LearningProgress, MarkedAnswer } from "@/lib/schemas/assignments";

type LearnSideProps = {
  params: { org: string; assignmentId: string };
  steps: ModuleStep[];
  stepIndex: number;
  progress: LearningProgress;
  stop: Stop | null;
  onEnter: (index: number) => void;
  onGoOn: (dealtWith: string) => void;
  onMarked: (marked: MarkedAnswer) => void;
  onLookAgain: (ms: number) => void;
};

/** Beside the picture: what must be dealt with now, the step's facts, and the way through the module. */
export function LearnSide(props: LearnSideProps) {
  const { steps, stepIndex, progress, stop } = props;
  const step = steps[stepIndex];
  const cautioned = stop?.kind === "caution" ? steps.find((candidate) => stop.id === `caution ${candidate.id}`) : undefined;
  return (
    <div className="grid gap-4">
      {cautioned && (
        <section className="grid gap-3 rounded border border-rule bg-sheet p-4" aria-label="Caution before this step">
          <h2 className="text-[1.4rem] leading-tight">Before “{cautioned.title}”</h2>
          {cautioned.facts.cautions.map((caution) => (
            <CautionPlate key={caution.id} caution={caution} />
          ))}
          <Button kind="main" autoFocus onClick={() => props.onGoOn(`caution ${cautioned.id}`)}>
            I have read this
          </Button>
        </section>
      )}
      {stop?.kind === "question" && (
        <div className="rounded border-2 border-strong bg-sheet p-4">
          <QuestionPanel
            key={stop.id}
            params={props.params}
            questionId={stop.id}
            onMarked={props.onMarked}
            onGoOn={() => props.onGoOn(stop.id)}
            onLookAgain={props.onLookAgain}
          />
        </div>
      )}
      {step && !stop && (
        <section className="grid gap-3 rounded border border-rule bg-sheet p-4" aria-label="This step">
          <p className="text-sm text-ink2">
            Step {stepIndex + 1} of {steps.length}
          </p>
          <h2 className="text-[1.5rem] leading-tight">{step.title}</h2>
          <StepFactsView facts={step.facts} />
        </section>
      )}
      <StepList {...props} />
      <KnowledgeState progress={progress} />
    </div>
  );
}

function StepList({ steps, stepIndex, progress, onEnter }: LearnSideProps) {
  const firstUnseen = steps.findIndex((step) => (progress.seen[step.id] ?? 0) < SEEN_SHARE);
  return (
    <nav aria-label="Steps" className="rounded border border-rule bg-sheet">
      <ol>
        {steps.map((step, index) => {
          const seen = progress.seen[step.id] ?? 0;
          const open = progress.knowledge.met || firstUnseen === -1 || index <= firstUnseen;
          return (
            <li key={step.id} className="border-b border-rule last:border-b-0">
              <button
                type="button"
                disabled={!open}
                aria-current={index === stepIndex ? "step" : undefined}
                onClick={() => onEnter(index)}
                className={`flex min-h-12 w-full items-center gap-3 px-3 py-2 text-left disabled:text-ink2 ${index === stepIndex ? "bg-tint font-semibold" : ""}`}
              >
                <SeenMark share={seen} />
                <span className="flex-1">
                  {step.title}
                  {!open && <span className="block text-sm font-normal">opens when the step before is seen</span>}
                </span>
                <Value className="text-sm text-ink2">{formatClock(step.endMs - step.startMs)}</Value>
              </button>
            </li>
          );
        })}
      </ol>
    </nav>
  );
}

/** Seen to the end: a filled square with its line; part of it: how far. */
function SeenMark({ share }: { share: number }) {
  const whole = share >= SEEN_SHARE;
  return (
    <span className="relative block size-5 shrink-0 overflow-hidden rounded border-[1.5px] border-strong bg-chalk" role="img" aria-label={whole ? "seen" : `${Math.round(share * 100)} % seen`}>
      <span className="absolute inset-x-0 bottom-0 bg-strong" style={{ height: `${whole ? 100 : share * 100}%` }} />
    </span>
  );
}

function KnowledgeState({ progress: { knowledge } }: { progress: LearningProgress }) {
  return (
    <section aria-live="polite" className="rounded border border-rule bg-sheet p-4">
      <h2 className="text-[1.2rem]">{knowledge.met ? "Known: the task is open" : "Before the task opens"}</h2>
      <p className="text-ink2">
        {knowledge.stepsSeen} of {knowledge.steps} steps seen · {knowledge.right} of {knowledge.questions} questions right
      </p>
      {!knowledge.met && (
        <ul className="mt-1 list-disc pl-5">
          {knowledge.missing.map((line) => (
            <li key={line}>{line}</li>
          ))}
        </ul>
      )}
    </section>
  );
}
