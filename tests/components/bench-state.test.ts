import { expect, test } from "vitest";
import { beginBench, bench, type BenchAct, type Draft } from "@/components/bench/bench-state";
import type { Question } from "@/lib/core/questions/types";
import { NO_FACTS, type Step } from "@/lib/core/steps/types";

const step = (id: string, startMs: number, endMs: number): Step => ({ id, title: id, startMs, endMs, facts: { ...NO_FACTS, tools: [`tool of ${id}`] } });
const question = (id: string, stepId: string, atMs: number): Question => ({
  id,
  stepId,
  atMs,
  prompt: id,
  explanation: "",
  lookAgainMs: 0,
  safetyCritical: false,
  body: { kind: "number", unit: "mm", value: 1, tolerance: 0, slips: [] },
});
const draft: Draft = { steps: [step("a", 0, 10_000), step("b", 10_000, 20_000)], questions: [question("q1", "a", 2000), question("q2", "a", 8000)] };
const after = (...acts: BenchAct[]) => acts.reduce(bench, beginBench(draft));

test("a step is split where the film stands: facts stay with the first part, questions go with theirs", () => {
  const { steps, questions } = after({ do: "split", atMs: 5000, newId: "n" }).draft;
  expect(steps.map(({ id, startMs, endMs }) => [id, startMs, endMs])).toEqual([
    ["a", 0, 5000],
    ["n", 5000, 10_000],
    ["b", 10_000, 20_000],
  ]);
  expect(steps.map(({ facts }) => facts.tools.length)).toEqual([1, 0, 1]);
  expect(questions.map(({ id, stepId }) => [id, stepId])).toEqual([
    ["q1", "a"],
    ["q2", "n"],
  ]);
});

test("joining puts two steps together and loses neither facts nor questions", () => {
  const { steps, questions } = after({ do: "split", atMs: 5000, newId: "n" }, { do: "join", stepId: "a" }, { do: "join", stepId: "a" }).draft;
  expect(steps.map(({ id, startMs, endMs, facts }) => [id, startMs, endMs, facts.tools])).toEqual([["a", 0, 20_000, ["tool of a", "tool of b"]]]);
  expect(questions.every(({ stepId }) => stepId === "a")).toBe(true);
});

test("an edge stops at its neighbour, and questions stay inside their step", () => {
  const late = after({ do: "set_end", stepId: "a", atMs: 15_000, durationMs: 30_000 }).draft;
  expect(late.steps[0]?.endMs).toBe(10_000);
  const early = after({ do: "set_end", stepId: "a", atMs: 4000, durationMs: 30_000 }).draft;
  expect(early.steps[0]?.endMs).toBe(4000);
  expect(early.questions.map(({ atMs }) => atMs)).toEqual([2000, 4000]);
});

test("a new step takes the free room, and none where a step stands", () => {
  expect(after({ do: "add", atMs: 20_000, newId: "n", durationMs: 24_000 }).draft.steps.at(-1)).toMatchObject({ startMs: 20_000, endMs: 24_000 });
  expect(after({ do: "add", atMs: 5000, newId: "n", durationMs: 24_000 }).draft).toBe(draft);
});

test("undo and redo go without limit, and an act that changes nothing is no act", () => {
  const state = after({ do: "remove_step", stepId: "a" }, { do: "remove_question", questionId: "none" }, { do: "remove_step", stepId: "b" });
  expect(state.draft.steps).toEqual([]);
  const back = [..."12"].reduce((now) => bench(now, { do: "undo" }), state);
  expect(back.draft).toEqual(draft);
  expect([..."1234"].reduce((now) => bench(now, { do: "redo" }), back).draft.steps).toEqual([]);
});
