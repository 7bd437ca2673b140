import { expect, test } from "vitest";
import { levelCap } from "@/lib/core/tasks/level-cap";
import type { TaskRule } from "@/lib/core/tasks/types";

// Level 4: three observations, two assessors, two vehicles (the demo scenario's rule; trade practice, "at least 3 observations, 2 observers").
const RULE: TaskRule = {
  practiceRuns: 0,
  evidencePhotos: 0,
  independence: true,
  licence: null,
  minimumAgeAlone: null,
  currencyMonths: 12,
  levelNeeds: [
    { level: 4, observations: 3, vehicles: 2, assessors: 2 },
    { level: 5, observations: 4, vehicles: 3, assessors: 2 },
  ],
};
const seen = (...pairs: [vehicle: string, assessorId: string][]) => pairs.map(([vehicle, assessorId]) => ({ vehicle, assessorId }));
const FOUR = seen(["DEMO 001", "a"], ["DEMO 002", "b"], ["DEMO 003", "a"], ["DEMO 001", "b"]);
const of = (more: Partial<Parameters<typeof levelCap>[0]> = {}) => ({
  rule: RULE,
  prompted: false,
  metObservations: FOUR,
  licences: [],
  ageYears: 20,
  ...more,
});

test("with nothing against it, level 5 and no reason", () => {
  expect(levelCap(of())).toEqual({ level: 5, reasons: [] });
});

// Source: product, "Task and sign-off" and "Safety"; situation 5 of the demo scenario for the age.
test.each([
  ["met only after a prompt", of({ prompted: true }), 3, ["A criterion was met only after a prompt."]],
  ["a licence that is not on record", of({ rule: { ...RULE, licence: "refrigerant" } }), 2, ["The licence “refrigerant” is not on record."]],
  ["another licence", of({ rule: { ...RULE, licence: "refrigerant" }, licences: ["high voltage"] }), 2, ["The licence “refrigerant” is not on record."]],
  ["the licence on record", of({ rule: { ...RULE, licence: "refrigerant" }, licences: ["refrigerant"] }), 5, []],
  ["seventeen where eighteen is asked for", of({ rule: { ...RULE, minimumAgeAlone: 18 }, ageYears: 17 }), 3, ["Under 18: a mentor stays alongside."]],
  ["eighteen", of({ rule: { ...RULE, minimumAgeAlone: 18 }, ageYears: 18 }), 5, []],
  ["no date of birth on record", of({ rule: { ...RULE, minimumAgeAlone: 18 }, ageYears: null }), 3, ["No date of birth on record to show an age of 18: a mentor stays alongside."]],
  ["no date of birth, and no age asked for", of({ ageYears: null }), 5, []],
] as const)("%s", (_name, given, level, reasons) => {
  expect(levelCap(given)).toEqual({ level, reasons });
});

test.each([
  ["the first observation", seen(["DEMO 001", "a"]), 3, "3 met observations (1 so far), 2 vehicles (1 so far), 2 assessors (1 so far)"],
  ["three on one vehicle", seen(["DEMO 001", "a"], ["demo 001 ", "b"], ["DEMO-001", "a"]), 3, "2 vehicles (1 so far)"],
  ["three by one assessor", seen(["DEMO 001", "a"], ["DEMO 002", "a"], ["DEMO 003", "a"]), 3, "2 assessors (1 so far)"],
  ["three, two and two", seen(["DEMO 001", "a"], ["DEMO 002", "b"], ["DEMO 001", "a"]), 4, "4 met observations (3 so far), 3 vehicles (2 so far)"],
] as const)("%s: the next level says what it needs", (_name, metObservations, level, lacking) => {
  const cap = levelCap(of({ metObservations: [...metObservations] }));
  expect(cap.level).toBe(level);
  expect(cap.reasons).toHaveLength(1);
  expect(cap.reasons[0]).toContain(`needs ${lacking}.`);
});

// Source: ten Cate, entrustment levels are noncontinuous: the lowest cap holds, nothing is averaged.
test("of several caps the lowest holds, and each has its sentence", () => {
  const rule = { ...RULE, licence: "refrigerant", minimumAgeAlone: 18 };
  const cap = levelCap(of({ rule, prompted: true, ageYears: 17, metObservations: seen(["DEMO 001", "a"]) }));
  expect(cap.level).toBe(2);
  expect(cap.reasons).toHaveLength(4);
});

test("a need of level 5 alone leaves 4 open; one of level 1 can't forbid being there", () => {
  const need = (level: 1 | 5) => ({ ...RULE, levelNeeds: [{ level, observations: 9, vehicles: 1, assessors: 1 }] });
  expect(levelCap(of({ rule: need(5) })).level).toBe(4);
  expect(levelCap(of({ rule: need(1) })).level).toBe(5);
});
