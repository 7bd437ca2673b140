import type { FieldProblem } from "@/lib/core/errors";
import { questionProblems } from "@/lib/core/questions/question-problems";
import type { Question } from "@/lib/core/questions/types";
import { stepProblems } from "@/lib/core/steps/step-problems";
import type { Step } from "@/lib/core/steps/types";

/** Everything that keeps a marking out from being kept, each with the path of what it is about. Empty when nothing does. */
export function markingProblems(steps: readonly Step[], questions: readonly Question[], durationMs: number): FieldProblem[] {
  return [
    ...repeated("steps", steps),
    ...repeated("questions", questions),
    ...eachStep(steps, durationMs),
    ...questions.flatMap((question, index) => {
      const step = steps.find((candidate) => candidate.id === question.stepId);
      return questionProblems(question, step).map((message) => ({ path: `questions.${index}`, message: `“${question.prompt}”: ${message}` }));
    }),
  ];
}

/** Each step alone, then with the one before it in the film: what only the two together have is an overlap. */
function eachStep(steps: readonly Step[], durationMs: number): FieldProblem[] {
  const inOrder = steps.map((step, index) => ({ step, index, alone: stepProblems([step], durationMs) })).toSorted((a, b) => a.step.startMs - b.step.startMs);
  return inOrder.flatMap(({ step, index, alone }, place) => {
    const before = inOrder[place - 1];
    const together = before ? stepProblems([before.step, step], durationMs).filter((message) => !alone.includes(message) && !before.alone.includes(message)) : [];
    return [...alone, ...together].map((message) => ({ path: `steps.${index}`, message }));
  });
}

function repeated(list: "steps" | "questions", items: readonly { id: string }[]): FieldProblem[] {
  const first = new Map<string, number>();
  return items.flatMap(({ id }, index) => {
    const earlier = first.get(id.toLowerCase());
    if (earlier === undefined) first.set(id.toLowerCase(), index);
    return earlier === undefined ? [] : [{ path: `${list}.${index}.id`, message: "This has the id of another one here." }];
  });
}
