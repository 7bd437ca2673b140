import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { knowledgeStanding } from "@/lib/core/modules/knowledge";
import { moduleProblems } from "@/lib/core/modules/module-problems";
import { revisionHash } from "@/lib/core/modules/revision-hash";
import type { ModuleContent, ModuleStep } from "@/lib/core/modules/types";
import type { Question } from "@/lib/core/questions/types";
import { NO_FACTS } from "@/lib/core/steps/types";

const step = (id: string, startMs = 0): ModuleStep => ({ id, title: `Step ${id}`, startMs, endMs: startMs + 10_000, facts: NO_FACTS, recordingId: "rec" });
const question = (id: string, more: Partial<Question> = {}): Question => ({
  id,
  stepId: "s1",
  atMs: 9_000,
  prompt: `Question ${id}?`,
  explanation: "Because.",
  lookAgainMs: 1_000,
  safetyCritical: false,
  body: {
    kind: "one_of",
    choices: [
      { id: "a", text: "This", right: true, why: "" },
      { id: "b", text: "That", right: false, why: "" },
    ],
  },
  ...more,
});
const MODULE: ModuleContent = {
  title: "Demo module",
  summary: "",
  steps: [step("s1"), step("s2", 10_000)],
  questions: [question("q1"), question("q2"), question("q3"), question("q4"), question("q5", { safetyCritical: true })],
  passRule: { share: 0.8 },
  taskIds: ["t1"],
};
const SEEN = new Map([
  ["s1", 1],
  ["s2", 1],
]);
const answers = (right: string[], wrong: string[] = []) => new Map([...right.map((id): [string, boolean] => [id, true]), ...wrong.map((id): [string, boolean] => [id, false])]);

// Source: product, "Module" and "Watching": a share of all questions, safety-critical ones always, steps seen at 95 %.
describe("knowledge rule", () => {
  test.each([
    ["all right", answers(["q1", "q2", "q3", "q4", "q5"]), SEEN, true, []],
    ["four of five, the safety-critical one among them", answers(["q1", "q2", "q3", "q5"], ["q4"]), SEEN, true, []],
    ["four of five, one never answered", answers(["q1", "q2", "q3", "q5"]), SEEN, true, []],
    ["four of five without the safety-critical one", answers(["q1", "q2", "q3", "q4"], ["q5"]), SEEN, false, ["1 safety-critical question not right yet."]],
    ["three of five", answers(["q1", "q2", "q5"], ["q3"]), SEEN, false, ["3 of 5 questions right, 4 needed."]],
    ["a step at 95 %", answers(["q1", "q2", "q3", "q4", "q5"]), new Map([...SEEN, ["s2", 0.95]]), true, []],
    ["a step at 94.9 %", answers(["q1", "q2", "q3", "q4", "q5"]), new Map([...SEEN, ["s2", 0.949]]), false, ["1 of 2 steps not seen to the end."]],
    ["a step of no length is not seen by that", answers(["q1", "q2", "q3", "q4", "q5"]), new Map([...SEEN, ["s2", Number.NaN]]), false, ["1 of 2 steps not seen to the end."]],
    [
      "nothing yet",
      answers([]),
      new Map<string, number>(),
      false,
      ["2 of 2 steps not seen to the end.", "1 safety-critical question not right yet.", "0 of 5 questions right, 4 needed."],
    ],
    ["answers to questions of an older revision", answers(["old1", "old2", "q1", "q2", "q5"]), SEEN, false, ["3 of 5 questions right, 4 needed."]],
  ])("%s", (_name, latest, seen, isMet, missing) => {
    const standing = knowledgeStanding(MODULE, latest, seen);
    expect(standing.met).toBe(isMet);
    expect(standing.missing).toEqual(missing);
  });

  test("a share counts whole questions, and nothing is asked twice for a rounding error", () => {
    // 0.7 × 10 is 7.000000000000001 in binary and 7 by hand; 0.75 × 5 is 3.75, so 4.
    for (const [share, n, needed] of [
      [0.7, 10, 7],
      [0.75, 5, 4],
      [0.1, 30, 3],
      [1, 5, 5],
      [0, 5, 0],
    ] as const) {
      const questions = Array.from({ length: n }, (_, index) => question(`n${index}`));
      const content = { ...MODULE, questions, passRule: { share } };
      const right = (count: number) => answers(questions.slice(0, count).map((each) => each.id));
      expect(knowledgeStanding(content, right(needed), SEEN).met).toBe(true);
      if (needed > 0) expect(knowledgeStanding(content, right(needed - 1), SEEN).met).toBe(false);
    }
  });

  test("one more right answer or one more second seen never takes the rule away", () => {
    const arm = fc.record({ right: fc.array(fc.boolean(), { minLength: 5, maxLength: 5 }), seen: fc.array(fc.constantFrom(0.949, 0.95, 1), { minLength: 2, maxLength: 2 }) });
    fc.assert(
      fc.property(arm, fc.nat(4), (given, better) => {
        const at = (right: boolean[]) =>
          knowledgeStanding(MODULE, new Map(right.map((isRight, index) => [`q${index + 1}`, isRight])), new Map(given.seen.map((share, index) => [`s${index + 1}`, share])));
        if (at(given.right).met) expect(at(given.right.with(better, true)).met).toBe(true);
      }),
    );
  });
});

describe("what keeps a module from being published", () => {
  test("nothing, when it is whole", () => {
    expect(moduleProblems(MODULE)).toEqual([]);
  });

  test.each([
    ["no title", { ...MODULE, title: " " }, /title/],
    ["no steps", { ...MODULE, steps: [], questions: [question("q", { stepId: "gone" })] }, /at least one step/],
    ["no questions", { ...MODULE, questions: [] }, /a film alone opens no task/],
    ["a share above one", { ...MODULE, passRule: { share: 1.01 } }, /between 0 and 100/],
    ["a share that is no number", { ...MODULE, passRule: { share: Number.NaN } }, /between 0 and 100/],
    ["a step twice", { ...MODULE, steps: [step("s1"), step("s1")] }, /once/],
    ["a question of a step that isn't there", { ...MODULE, questions: [question("q", { stepId: "gone" })] }, /^“Question q\?”: /],
    ["a question before its step", { ...MODULE, questions: [question("q", { stepId: "s2", atMs: 9_999 })] }, /outside its step/],
    ["a question after its step", { ...MODULE, questions: [question("q", { atMs: 10_001 })] }, /outside its step/],
    ["a question without a right answer", { ...MODULE, questions: [question("q", { body: { kind: "put_in_order", items: [], neverBefore: [] } })] }, /at least two/],
  ])("%s", (_name, content, sentence) => {
    expect(moduleProblems(content).some((problem) => sentence.test(problem))).toBe(true);
  });

  test("a question may stand on its step's last moment: the film stops there", () => {
    expect(moduleProblems({ ...MODULE, questions: [question("q", { atMs: 10_000 })] })).toEqual([]);
  });
});

// Source: product, "Module": a revision is known by the hash of its content; the canonical text is RFC 8785.
describe("a revision's hash", () => {
  const reversed = (value: object) => Object.fromEntries(Object.entries(value).toReversed());

  test("doesn't depend on the order in which its members were stored", () => {
    expect(revisionHash(reversed(MODULE) as ModuleContent)).toBe(revisionHash(MODULE));
    expect(revisionHash(MODULE)).toMatch(/^[0-9a-f]{64}$/);
  });

  test.each([
    ["a step's end", { ...MODULE, steps: [{ ...step("s1"), endMs: 9_999 }, step("s2", 10_000)] }],
    ["the order of the steps", { ...MODULE, steps: MODULE.steps.toReversed() }],
    ["a word of a question", { ...MODULE, questions: [question("q1", { prompt: "Question q1 ?" }), ...MODULE.questions.slice(1)] }],
    ["the rule", { ...MODULE, passRule: { share: 0.9 } }],
    ["a task", { ...MODULE, taskIds: ["t2"] }],
  ])("changes with %s", (_name, content) => {
    expect(revisionHash(content)).not.toBe(revisionHash(MODULE));
  });
});
