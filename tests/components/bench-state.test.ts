import { expect, test } from "vitest";
import { beginBench, bench, NAMELESS, stepAt, type BenchAct, type Draft } from "@/components/bench/bench-state";
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

test("what is done in one go, a drag or a visit to a field, is undone at once; the next go is another", () => {
  const drag = (atMs: number, strand: string): BenchAct => ({ do: "set_end", stepId: "b", atMs, durationMs: 30_000, strand });
  const state = after(drag(18_000, "drag 1"), drag(17_000, "drag 1"), drag(16_000, "drag 2"));
  expect(state.undo).toHaveLength(2);
  const once = bench(state, { do: "undo" });
  expect(once.draft.steps[1]?.endMs).toBe(17_000);
  expect(bench(once, { do: "undo" }).draft).toEqual(draft);
  // After an undo even the same go begins anew.
  expect(bench(once, drag(15_000, "drag 1")).undo).toHaveLength(2);
});

test("a new act after undoing forgets what could have been done again", () => {
  const undone = after({ do: "remove_step", stepId: "b" }, { do: "undo" });
  expect(undone.redo).toHaveLength(1);
  expect(bench(undone, { do: "join", stepId: "a" }).redo).toEqual([]);
});

test("a split too near an edge, a join of the last and a removal of nothing change nothing", () => {
  const acts: BenchAct[] = [
    { do: "split", atMs: 100, newId: "n" },
    { do: "split", atMs: 9900, newId: "n" },
    { do: "split", atMs: 25_000, newId: "n" },
    { do: "join", stepId: "b" },
    { do: "remove_step", stepId: "none" },
    { do: "undo" },
    { do: "redo" },
  ];
  for (const act of acts) expect(after(act), act.do).toMatchObject({ draft, undo: [] });
});

test("a part without a name takes its neighbour's when they are joined; a name is never lost to it", () => {
  const split = after({ do: "split", atMs: 5000, newId: "n" });
  expect(split.draft.steps[1]?.title).toBe(NAMELESS);
  expect(bench(split, { do: "join", stepId: "n" }).draft.steps[1]?.title).toBe("b");
  expect(bench(split, { do: "join", stepId: "a" }).draft.steps[0]?.title).toBe("a");
});

test("a change of a step's words never moves its edges", () => {
  const { steps } = after({ do: "change_step", step: { ...step("a", 1, 2), title: "renamed" } }).draft;
  expect(steps[0]).toMatchObject({ title: "renamed", startMs: 0, endMs: 10_000 });
});

test("a moment between two steps belongs to the later one, and past the last to none", () => {
  expect([0, 9999, 10_000, 20_000].map((ms) => stepAt(draft.steps, ms)?.id)).toEqual(["a", "a", "b", undefined]);
});
