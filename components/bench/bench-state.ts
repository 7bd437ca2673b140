import type { Question } from "@/lib/core/questions/types";
import { NO_FACTS, type Step } from "@/lib/core/steps/types";

/** What is being marked out. Steps stand in the order of the film and never overlap; whatever is done keeps it so. */
export type Draft = { steps: Step[]; questions: Question[] };
/** `strand` names the go that the last act belonged to: a drag, a visit to a field. Acts of one go are undone together. */
export type BenchState = { draft: Draft; undo: Draft[]; redo: Draft[]; strand: string | null };

export type BenchAct = { strand?: string } & Act;

type Act =
  | { do: "split"; atMs: number; newId: string }
  | { do: "add"; atMs: number; newId: string; durationMs: number }
  | { do: "join"; stepId: string }
  | { do: "remove_step"; stepId: string }
  | { do: "set_start"; stepId: string; atMs: number }
  | { do: "set_end"; stepId: string; atMs: number; durationMs: number }
  | { do: "change_step"; step: Step }
  | { do: "put_question"; question: Question }
  | { do: "remove_question"; questionId: string }
  | { do: "load"; draft: Draft }
  | { do: "undo" }
  | { do: "redo" };

/** Shorter than this nothing can be seen. */
const SHORTEST_MS = 200;
/** Undoing goes back this far. */
const MOST_UNDO = 300;
/** What a step is called until it has a name: it is kept all the same. */
export const NAMELESS = "Not named yet";
/** A new step is as long as this where there is room. */
const FIRST_LENGTH_MS = 10_000;

export const beginBench = (draft: Draft): BenchState => ({ draft, undo: [], redo: [], strand: null });

/** One act on the bench. An act that can't be done changes nothing, and then there is nothing to undo. */
export function bench(state: BenchState, act: BenchAct): BenchState {
  if (act.do === "undo") {
    const before = state.undo.at(-1);
    return before ? { draft: before, undo: state.undo.slice(0, -1), redo: [...state.redo, state.draft], strand: null } : state;
  }
  if (act.do === "redo") {
    const after = state.redo.at(-1);
    return after ? { draft: after, undo: [...state.undo, state.draft], redo: state.redo.slice(0, -1), strand: null } : state;
  }
  if (act.do === "load") return beginBench(act.draft);
  const draft = change(state.draft, act);
  if (draft === state.draft) return state;
  const goesOn = act.strand !== undefined && act.strand === state.strand;
  return { draft, undo: goesOn ? state.undo : [...state.undo, state.draft].slice(-MOST_UNDO), redo: [], strand: act.strand ?? null };
}

/** The step that a moment lies in. */
export const stepAt = (steps: readonly Step[], atMs: number): Step | undefined => steps.find((step) => atMs >= step.startMs && atMs < step.endMs);

type Edit = Exclude<Act, { do: "undo" | "redo" | "load" }>;

function change(draft: Draft, act: Edit): Draft {
  switch (act.do) {
    case "split":
      return split(draft, act.atMs, act.newId);
    case "add":
      return add(draft, act);
    case "join":
      return join(draft, act.stepId);
    case "remove_step":
      if (!draft.steps.some((step) => step.id === act.stepId)) return draft;
      return { steps: draft.steps.filter((step) => step.id !== act.stepId), questions: draft.questions.filter((question) => question.stepId !== act.stepId) };
    case "set_start":
    case "set_end":
      return moveEdge(draft, act);
    case "change_step":
      return { ...draft, steps: draft.steps.map((step) => (step.id === act.step.id ? { ...act.step, startMs: step.startMs, endMs: step.endMs } : step)) };
    case "put_question":
      return putQuestion(draft, act.question);
    case "remove_question":
      return draft.questions.some((question) => question.id === act.questionId)
        ? { ...draft, questions: draft.questions.filter((question) => question.id !== act.questionId) }
        : draft;
  }
}

/** Cuts the step at a moment in two; its facts stay with the first, its questions with the part they lie in. */
function split(draft: Draft, atMs: number, newId: string): Draft {
  const step = stepAt(draft.steps, atMs);
  if (!step || atMs - step.startMs < SHORTEST_MS || step.endMs - atMs < SHORTEST_MS) return draft;
  const second: Step = { id: newId, title: NAMELESS, startMs: atMs, endMs: step.endMs, facts: NO_FACTS };
  return {
    steps: draft.steps.flatMap((other) => (other.id === step.id ? [{ ...step, endMs: atMs }, second] : [other])),
    questions: draft.questions.map((question) => (question.stepId === step.id && question.atMs > atMs ? { ...question, stepId: newId } : question)),
  };
}

/** A new step from a moment on, in the free room there. */
function add(draft: Draft, { atMs, newId, durationMs }: Extract<Edit, { do: "add" }>): Draft {
  if (stepAt(draft.steps, atMs)) return draft;
  const next = draft.steps.find((step) => step.startMs >= atMs);
  const endMs = Math.min(atMs + FIRST_LENGTH_MS, next?.startMs ?? durationMs, durationMs);
  if (endMs - atMs < SHORTEST_MS) return draft;
  const step: Step = { id: newId, title: NAMELESS, startMs: atMs, endMs, facts: NO_FACTS };
  return { ...draft, steps: [...draft.steps, step].toSorted((a, b) => a.startMs - b.startMs) };
}

/** Joins a step with the one after it; names, facts and questions of both are kept. */
function join(draft: Draft, stepId: string): Draft {
  const index = draft.steps.findIndex((step) => step.id === stepId);
  const [step, next] = [draft.steps[index], draft.steps[index + 1]];
  if (!step || !next) return draft;
  const facts = {
    fasteners: [...step.facts.fasteners, ...next.facts.fasteners],
    tools: [...new Set([...step.facts.tools, ...next.facts.tools])],
    parts: [...step.facts.parts, ...next.facts.parts],
    fluids: [...step.facts.fluids, ...next.facts.fluids],
    cautions: [...step.facts.cautions, ...next.facts.cautions],
    faultCodes: [...new Set([...step.facts.faultCodes, ...next.facts.faultCodes])],
  };
  const joined: Step = { ...step, title: step.title === NAMELESS ? next.title : step.title, endMs: next.endMs, facts };
  return {
    steps: draft.steps.flatMap((other) => (other.id === step.id ? [joined] : other.id === next.id ? [] : [other])),
    questions: draft.questions.map((question) => (question.stepId === next.id ? { ...question, stepId: step.id } : question)),
  };
}

/** Moves one edge as far as the neighbours and the film allow; questions stay inside their step. */
function moveEdge(draft: Draft, act: Extract<Edit, { do: "set_start" | "set_end" }>): Draft {
  const index = draft.steps.findIndex((step) => step.id === act.stepId);
  const step = draft.steps[index];
  if (!step) return draft;
  const moved: Step =
    act.do === "set_start"
      ? { ...step, startMs: Math.min(Math.max(act.atMs, draft.steps[index - 1]?.endMs ?? 0), step.endMs - SHORTEST_MS) }
      : { ...step, endMs: Math.max(Math.min(act.atMs, draft.steps[index + 1]?.startMs ?? act.durationMs), step.startMs + SHORTEST_MS) };
  if (moved.startMs === step.startMs && moved.endMs === step.endMs) return draft;
  const inside = (ms: number) => Math.min(Math.max(ms, moved.startMs), moved.endMs);
  return {
    steps: draft.steps.map((other) => (other.id === step.id ? moved : other)),
    questions: draft.questions.map((question) => (question.stepId === step.id ? { ...question, atMs: inside(question.atMs) } : question)),
  };
}

function putQuestion(draft: Draft, question: Question): Draft {
  const known = draft.questions.some((other) => other.id === question.id);
  const questions = known ? draft.questions.map((other) => (other.id === question.id ? question : other)) : [...draft.questions, question];
  return { ...draft, questions: questions.toSorted((a, b) => a.atMs - b.atMs) };
}
