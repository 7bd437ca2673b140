import { NAMELESS, type Draft } from "@/components/bench/bench-state";
import { questionProblems } from "@/lib/core/questions/question-problems";
import type { Question } from "@/lib/core/questions/types";
import { parseTightening } from "@/lib/core/steps/parse-tightening";
import type { Caution, Fastener, Step, StepFacts } from "@/lib/core/steps/types";

/** One thing that is not finished, and what finishes it. It stays on this device until then. */
export type Unfinished = { about: { kind: "step" | "question"; id: string }; words: string };

/**
 * What of a draft the server can keep now. A thing that is still being written doesn't hold up the rest: in its place goes what was
 * kept of it last, or nothing.
 */
export function keepable(draft: Draft, kept: Draft): { draft: Draft; unfinished: Unfinished[] } {
  const unfinished: Unfinished[] = [];
  const steps = draft.steps.map((step) => {
    const report = (words: string) => unfinished.push({ about: { kind: "step", id: step.id }, words: `“${step.title}”: ${words}` });
    return { ...step, title: step.title.trim() || NAMELESS, facts: keepableFacts(step, kept.steps.find(({ id }) => id === step.id)?.facts, report) };
  });
  const questions = draft.questions.flatMap((question): Question[] => {
    const problems = questionProblems(question, steps.find(({ id }) => id === question.stepId));
    if (problems.length === 0) return [withoutEmptySlips(question)];
    unfinished.push({ about: { kind: "question", id: question.id }, words: `${question.prompt.trim() ? `“${question.prompt.trim()}”` : "A question"}: ${problems.join(" ")}` });
    const earlier = kept.questions.find(({ id }) => id === question.id);
    return earlier ? [{ ...earlier, atMs: question.atMs, stepId: question.stepId }] : [];
  });
  return { draft: { steps, questions }, unfinished };
}

/** A slip without a number is a line that was added and not written yet. */
function withoutEmptySlips(question: Question): Question {
  const { body } = question;
  return body.kind === "number" ? { ...question, body: { ...body, slips: body.slips.filter(({ value }) => Number.isFinite(value)) } } : question;
}

const FAULT_CODE = /^[PCBU][0-3][0-9A-F]{3}$/;

function keepableFacts({ facts }: Step, kept: StepFacts | undefined, report: (words: string) => void): StepFacts {
  const written = <Item extends { id: string }>(items: Item[], earlier: Item[] | undefined, problemOf: (item: Item) => string | null): Item[] =>
    items.flatMap((item) => {
      const problem = problemOf(item);
      if (problem === null) return [item];
      report(problem);
      return earlier?.find(({ id }) => id === item.id) ?? [];
    });
  return {
    fasteners: written(facts.fasteners, kept?.fasteners, fastenerProblem),
    cautions: written(facts.cautions, kept?.cautions, cautionProblem),
    tools: facts.tools,
    parts: facts.parts,
    // A fluid without a name is a line that was added and not written yet.
    fluids: facts.fluids.filter(({ kind }) => kind.trim() !== ""),
    faultCodes: facts.faultCodes.filter((code) => {
      if (FAULT_CODE.test(code)) return true;
      report(`“${code}” is no fault code. One is like P0301.`);
      return false;
    }),
  };
}

function fastenerProblem({ name, acrossFlatsMm, tightening }: Fastener): string | null {
  if (name.trim() === "") return "Name the fastener.";
  if (acrossFlatsMm !== null && !(acrossFlatsMm > 0 && acrossFlatsMm <= 200)) return `${name}: across flats is up to 200 mm.`;
  const parsed = tightening && parseTightening(tightening.entered);
  return parsed && "problem" in parsed ? `${name}: ${parsed.problem}` : null;
}

function cautionProblem({ hazard, instruction }: Caution): string | null {
  if (hazard.trim() === "") return "Say what can hurt.";
  return instruction.trim() === "" ? "Say what to do about it." : null;
}
