import { expect, test } from "vitest";
import { DEMO_TASKS } from "@/db/seeds/demo/tasks";
import { readyProblems } from "@/lib/core/tasks/ready-problems";
import { taskProblems } from "@/lib/core/tasks/task-problems";
import type { Criterion, LevelNeed, ReadingSpec, TaskContent } from "@/lib/core/tasks/types";

const READING: ReadingSpec = { mode: "set", quantity: "tightening value", unit: "N·m", lower: 24, upper: 26, resolution: 0.1, instrumentKind: null };
const CRITERION: Criterion = {
  key: "C1",
  group: "Fit",
  kind: "measured",
  text: "Tightens the bolt",
  metLooksLike: "25 N·m.",
  required: true,
  safetyCritical: false,
  reading: READING,
};
const TASK: TaskContent = {
  title: "Demo task",
  shortTitle: "Demo",
  area: "Brakes",
  conditions: "",
  criteria: [CRITERION],
  rule: { practiceRuns: 1, evidencePhotos: 1, independence: false, licence: null, minimumAgeAlone: 18, currencyMonths: 12, levelNeeds: [] },
};
const criterion = (more: Partial<Criterion>): TaskContent => ({ ...TASK, criteria: [{ ...CRITERION, ...more }] });
const reading = (more: Partial<ReadingSpec>): TaskContent => criterion({ reading: { ...READING, ...more } });
const rule = (more: Partial<TaskContent["rule"]>): TaskContent => ({ ...TASK, rule: { ...TASK.rule, ...more } });
const needs = (...levelNeeds: LevelNeed[]): TaskContent => rule({ levelNeeds });

test.each(Object.entries(DEMO_TASKS))("the demo's %s can be published", (_key, content) => {
  expect(taskProblems(content)).toEqual([]);
});

test.each([
  ["no title", { ...TASK, title: " " }, /title/],
  ["no short title", { ...TASK, shortTitle: "" }, /short title/],
  ["no criterion", { ...TASK, criteria: [] }, /at least one required/],
  ["nothing required", criterion({ required: false }), /at least one required/],
  ["two of one key", { ...TASK, criteria: [CRITERION, CRITERION] }, /same key/],
  ["no text", criterion({ text: "" }), /what is looked at/],
  ["no picture of met", criterion({ metLooksLike: "" }), /what met looks like/],
  ["measured, but nothing to read", criterion({ reading: null }), /which reading/],
  ["a unit that nobody knows", reading({ unit: "furlong" }), /not a unit/],
  ["no limit", reading({ lower: null, upper: null }), /lower or an upper limit/],
  ["limits the wrong way round", reading({ lower: 26, upper: 24 }), /above the upper/],
  ["a limit that is no number", reading({ upper: Number.NaN }), /a limit is a number/],
  ["no resolution", reading({ resolution: 0 }), /smallest step/],
  ["half a practice run", rule({ practiceRuns: 0.5 }), /practice runs/],
  ["never current", rule({ currencyMonths: 0 }), /stays current/],
  ["a licence without a name", rule({ licence: " " }), /Name the licence/],
  ["one level said twice", needs({ level: 4, observations: 2, vehicles: 1, assessors: 1 }, { level: 4, observations: 2, vehicles: 1, assessors: 1 }), /said twice/],
  ["more vehicles than observations", needs({ level: 4, observations: 2, vehicles: 3, assessors: 1 }), /more vehicles or assessors/],
  ["level 5 for less than level 4", needs({ level: 5, observations: 2, vehicles: 1, assessors: 1 }, { level: 4, observations: 3, vehicles: 1, assessors: 1 }), /less than the level below/],
] as const)("%s is one problem, said once", (_name, content, sentence) => {
  const problems = taskProblems(content as TaskContent);
  expect(problems).toHaveLength(1);
  expect(problems[0]).toMatch(sentence);
});

test("safety-critical is required, so it is enough", () => {
  expect(taskProblems(criterion({ required: false, safetyCritical: true }))).toEqual([]);
});

// Source: product, "Task and sign-off": ready means rule met, practice runs done, evidence attached.
const RULE = { practiceRuns: 2, evidencePhotos: 1 };
const DONE = { hasModule: true, knowledgeMet: true, practiceRuns: 2, evidencePhotos: 1 };
test.each([
  ["everything there", DONE, []],
  ["more than asked for", { ...DONE, practiceRuns: 5, evidencePhotos: 4 }, []],
  ["the module not known", { ...DONE, knowledgeMet: false }, ["Learn the module that opens this task."]],
  ["no module opens it", { ...DONE, hasModule: false, knowledgeMet: false }, []],
  ["a run short", { ...DONE, practiceRuns: 1 }, ["1 more practice run."]],
  ["all short", { hasModule: true, knowledgeMet: false, practiceRuns: 0, evidencePhotos: 0 }, ["Learn the module that opens this task.", "2 more practice runs.", "1 more photo of your work."]],
])("ready: %s", (_name, progress, missing) => {
  expect(readyProblems(RULE, progress)).toEqual(missing);
});
