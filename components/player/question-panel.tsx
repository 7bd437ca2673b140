"use client";

import { useMutation } from "@tanstack/react-query";
import { useEffect, useRef } from "react";
import { api } from "@/components/api/client";
import { AnswerForm } from "@/components/player/answer-form";
import { Button } from "@/components/ui/button";
import { Notice } from "@/components/ui/notice";
import { Tag } from "@/components/ui/tag";
import { formatClock } from "@/lib/core/webvtt/timestamps";
import type { GivenAnswer } from "@/lib/core/questions/types";
import type { MarkedAnswer } from "@/lib/schemas/assignments";

type QuestionPanelProps = {
  params: { org: string; assignmentId: string };
  questionId: string;
  onMarked: (marked: MarkedAnswer) => void;
  onGoOn: () => void;
  onLookAgain: (ms: number) => void;
};

/** Asks one question, shows why it was right or wrong, and leads back where it was wrong. */
export function QuestionPanel({ params, questionId, onMarked, onGoOn, onLookAgain }: QuestionPanelProps) {
  const heading = useRef<HTMLHeadingElement>(null);
  const asking = useMutation({
    mutationFn: () => api("POST /orgs/{org}/assignments/{assignmentId}/attempts", { params, body: { questionId } }),
  });
  const answering = useMutation({
    mutationFn: (answer: { attemptId: string; given: GivenAnswer }) =>
      api("POST /orgs/{org}/assignments/{assignmentId}/answers", { params, body: answer }),
    onSuccess: onMarked,
  });
  const { mutate: ask } = asking;
  useEffect(() => ask(), [ask, questionId]);
  useEffect(() => heading.current?.focus(), [asking.data]);

  const askAgain = () => {
    answering.reset();
    ask();
  };
  const marked = answering.data;
  const problem = asking.error ?? answering.error;
  return (
    <section aria-label="Question" className="grid gap-3">
      <h2 ref={heading} tabIndex={-1} className="text-[1.4rem] leading-tight outline-none">
        {asking.data?.prompt ?? "The question is coming"}
      </h2>
      {asking.data?.safetyCritical && (
        <p>
          <Tag kind="safety">safety</Tag> <span className="text-sm text-ink2">must be right before the task opens</span>
        </p>
      )}
      {problem && (
        <Notice kind="error" title={problem.message}>
          <Button onClick={() => (answering.error && answering.variables ? answering.mutate(answering.variables) : askAgain())}>Try again</Button>
        </Notice>
      )}
      {!marked && asking.data && (
        <AnswerForm
          key={asking.data.attemptId}
          asked={asking.data}
          busy={answering.isPending}
          onAnswer={(given) => asking.data && answering.mutate({ attemptId: asking.data.attemptId, given })}
        />
      )}
      {marked?.right && (
        <>
          <Notice kind="done" title="Right.">
            {marked.why}
          </Notice>
          <Button kind="main" onClick={onGoOn} autoFocus>
            Go on
          </Button>
        </>
      )}
      {marked && !marked.right && (
        <>
          <Notice kind="error" title="Not right yet.">
            {marked.why}
          </Notice>
          <div className="flex flex-wrap gap-3">
            {marked.lookAgainMs !== null && (
              <Button kind="main" autoFocus onClick={() => onLookAgain(marked.lookAgainMs ?? 0)}>
                Look again at {formatClock(marked.lookAgainMs)}
              </Button>
            )}
            <Button onClick={askAgain}>Answer again</Button>
          </div>
        </>
      )}
    </section>
  );
}
