"use client";

import type { Draft } from "@/components/bench/bench-state";
import type { Chosen } from "@/components/bench/chosen";
import type { useSaving } from "@/components/bench/use-saving";
import { Button } from "@/components/ui/button";
import { Notice } from "@/components/ui/notice";

const counts = ({ steps, questions }: Draft): string =>
  `${steps.length} ${steps.length === 1 ? "step" : "steps"}, ${questions.length} ${questions.length === 1 ? "question" : "questions"}`;

type SavingNoticesProps = { saving: ReturnType<typeof useSaving>; draft: Draft; onChoose: (chosen: Chosen) => void };

/** What became of the work, where it isn't simply saved: what is safe, and what to do. */
export function SavingNotices({ saving, draft, onChoose }: SavingNoticesProps) {
  const { state, unfinished, aside } = saving;
  return (
    <>
      {state.kind === "conflict" && (
        <Notice kind="error" title="This was saved from elsewhere meanwhile. Yours is kept here.">
          <p>
            Yours: {counts(draft)}. Theirs: {counts(state.theirs)}
            {state.theirs.savedBy && `, saved by ${state.theirs.savedBy}`}.
          </p>
          <div className="mt-2 flex flex-wrap gap-2">
            <Button onClick={() => saving.loadTheirs(state.theirs)}>Load theirs</Button>
            <Button onClick={() => saving.keepMine(state.theirs)}>Put mine in its place</Button>
          </div>
        </Notice>
      )}
      {aside && (
        <Notice title={aside.why === "replaced" ? "Theirs is on the bench. Yours is still here." : "On this device lies a marking out that was not saved."}>
          <p>
            {aside.why === "unsaved" && "Somebody saved since. "}It has {counts(aside.copy.draft)}.
          </p>
          <div className="mt-2 flex flex-wrap gap-2">
            <Button onClick={saving.takeAside}>Take mine back</Button>
            <Button kind="quiet" onClick={saving.dropAside}>
              Let it go
            </Button>
          </div>
        </Notice>
      )}
      {state.kind === "refused" && (
        <Notice kind="error" title={state.message}>
          <ul className="list-disc pl-5">
            {state.problems.map((problem) => (
              <li key={`${problem.path} ${problem.message}`}>{problem.message}</li>
            ))}
          </ul>
        </Notice>
      )}
      {unfinished.length > 0 && (
        <details className="rounded border border-rule border-l-[6px] border-l-steel bg-chalk px-4 py-1.5">
          <summary className="min-h-11 py-2 font-semibold">
            {unfinished.length === 1 ? "One thing is not finished. It is kept on this device; the rest is saved." : `${unfinished.length} things are not finished. They are kept on this device; the rest is saved.`}
          </summary>
          <ul className="pb-2">
            {unfinished.map(({ about, words }) => (
              <li key={`${about.id} ${words}`}>
                <button type="button" className="min-h-11 text-left underline underline-offset-4" onClick={() => onChoose(about)}>
                  {words}
                </button>
              </li>
            ))}
          </ul>
        </details>
      )}
    </>
  );
}
