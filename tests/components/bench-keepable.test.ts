import { expect, test } from "vitest";
import { NAMELESS, type Draft } from "@/components/bench/bench-state";
import { keepable } from "@/components/bench/keepable";
import { readTime, shortTime } from "@/components/bench/time-field";
import type { Question } from "@/lib/core/questions/types";
import { NO_FACTS, type Fastener, type Step } from "@/lib/core/steps/types";

const step = (facts: Partial<Step["facts"]> = {}, title = "Wheel off"): Step => ({ id: "s", title, startMs: 0, endMs: 10_000, facts: { ...NO_FACTS, ...facts } });
const question = (over: Partial<Question> = {}): Question => ({
  id: "q",
  stepId: "s",
  atMs: 1000,
  prompt: "How thick?",
  explanation: "",
  lookAgainMs: 0,
  safetyCritical: false,
  body: { kind: "number", unit: "mm", value: 22, tolerance: 0, slips: [] },
  ...over,
});
const bolt = (entered: string): Fastener => ({
  id: "f",
  name: "Bolt",
  count: 2,
  acrossFlatsMm: 17,
  oneTimeUse: false,
  tightening: { entered, newtonMetres: 0, angleDegrees: null, source: "invented for this test" },
});
const NONE: Draft = { steps: [], questions: [] };

test("what is finished goes as it is", () => {
  const draft = { steps: [step({ fasteners: [bolt("25 Nm")] })], questions: [question()] };
  expect(keepable(draft, NONE)).toEqual({ draft, unfinished: [] });
});

test("a question that is still being written stays here; one that was kept before stays kept, and moves with its step", () => {
  const writing = question({ prompt: "", atMs: 3000 });
  const fresh = keepable({ steps: [step()], questions: [writing] }, NONE);
  expect(fresh.draft.questions).toEqual([]);
  expect(fresh.unfinished).toMatchObject([{ about: { kind: "question", id: "q" } }]);
  const before = keepable({ steps: [step()], questions: [writing] }, { steps: [step()], questions: [question()] });
  expect(before.draft.questions).toEqual([question({ atMs: 3000 })]);
});

test("a value that is not understood yet doesn't hold up its step: the fastener as it was kept goes, or none", () => {
  const draft = { steps: [step({ fasteners: [bolt("25")], tools: ["Socket 17 mm"] })], questions: [] };
  expect(keepable(draft, NONE).draft.steps[0]?.facts).toEqual({ ...NO_FACTS, tools: ["Socket 17 mm"] });
  expect(keepable(draft, { steps: [step({ fasteners: [bolt("20 Nm")] })], questions: [] }).draft.steps[0]?.facts.fasteners).toEqual([bolt("20 Nm")]);
  expect(keepable(draft, NONE).unfinished).toHaveLength(1);
});

test("names that were cleared, lines that were added and not written, codes that are none", () => {
  const empty = step({ faultCodes: ["P0301", "P9"], fluids: [{ kind: "", amount: "" }], cautions: [{ id: "c", grade: "caution", sign: "W001", hazard: "", instruction: "", waitSeconds: null }] }, " ");
  const { draft, unfinished } = keepable({ steps: [empty], questions: [question({ body: { kind: "number", unit: "mm", value: 1, tolerance: 0, slips: [{ value: NaN, hint: "" }] } })] }, NONE);
  expect(draft.steps[0]).toEqual({ ...step({ faultCodes: ["P0301"] }), title: NAMELESS });
  expect(draft.questions[0]?.body).toMatchObject({ slips: [] });
  expect(unfinished.map(({ words }) => words)).toHaveLength(2);
});

test.each([
  ["83.5", 83_500],
  ["1:23.5", 83_500],
  ["1:23,5", 83_500],
  ["0:01:23.500", 83_500],
  ["02:41.847", 161_847],
  ["1:00:00", 3_600_000],
])("a time typed as %s", (text, ms) => {
  expect(readTime(text)).toBe(ms);
});

test.each(["", "a", "1:", "1:2:3:4", "-1", "1.2345"])("“%s” is no time", (text) => {
  expect(readTime(text)).toBeNull();
});

test("a time is read back as it is shown", () => {
  for (const ms of [0, 40, 83_500, 161_847, 3_600_001]) expect(readTime(shortTime(ms))).toBe(ms);
});
