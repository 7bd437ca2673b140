import { demoId } from "@/db/seeds/demo/demo-id";
import type { FilmTimings, MarkingOut, QuestionDraft } from "@/db/seeds/demo/films/types";
import type { StepFacts } from "@/lib/core/steps/types";

/** A question waits until the sentence before it has rung out, and comes before the next one begins. */
const AFTER_LINE_MS = 200;

/**
 * Puts facts and questions where the film says them.
 * @throws Error when a question names a line that the film doesn't have, or a step has no facts
 */
export function markOut(timings: FilmTimings, facts: Record<string, StepFacts>, drafts: readonly QuestionDraft[]): MarkingOut {
  const stepId = (key: string): string => demoId(`${timings.film}/step/${key}`);
  const line = (key: string) => {
    const found = timings.lines.find((entry) => entry.key === key);
    if (!found) throw new Error(`The film “${timings.film}” has no line “${key}”.`);
    return found;
  };
  return {
    steps: timings.steps.map(({ key, title, startMs, endMs }) => {
      const own = facts[key];
      if (!own) throw new Error(`Step ${key} of “${timings.film}” has no facts.`);
      return { id: stepId(key), title, startMs, endMs, facts: own };
    }),
    questions: drafts.map(({ key, after, lookAgain, ...question }) => ({
      id: demoId(`${timings.film}/question/${key}`),
      stepId: stepId(line(after).step),
      atMs: line(after).endMs + AFTER_LINE_MS,
      lookAgainMs: line(lookAgain).startMs,
      ...question,
    })),
  };
}
