import fc from "fast-check";
import { expect, test } from "vitest";
import { observationOutcome } from "@/lib/core/tasks/observation-outcome";
import { MARKS, type Criterion, type CriterionMark, type Mark, type ReadingSpec, type TaskContent } from "@/lib/core/tasks/types";

const SET: ReadingSpec = { mode: "set", quantity: "tightening value", unit: "N·m", lower: 24, upper: 26, resolution: 0.1, instrumentKind: null };
const criterion = (key: string, more: Partial<Criterion> = {}): Criterion => ({
  key,
  group: "Fit",
  kind: "seen",
  text: `Criterion ${key}`,
  metLooksLike: "As shown.",
  required: true,
  safetyCritical: false,
  reading: null,
  ...more,
});
const task = (...criteria: Criterion[]): TaskContent => ({
  title: "Demo task",
  shortTitle: "Demo",
  area: "Brakes",
  conditions: "",
  criteria,
  rule: { practiceRuns: 0, evidencePhotos: 0, independence: false, licence: null, minimumAgeAlone: null, currencyMonths: 12, levelNeeds: [] },
});
const put = (key: string, mark: Mark | null, value?: number, more: Partial<CriterionMark> = {}): CriterionMark => ({
  key,
  mark,
  reading: value === undefined ? null : { value, unit: "N·m", instrumentId: null, instrumentInDate: null },
  prompts: 0,
  remark: "",
  ...more,
});

const A = criterion("A");
const OPTIONAL = criterion("B", { required: false });
const CRITICAL = criterion("C", { required: false, safetyCritical: true });
const MEASURED = criterion("D", { kind: "measured", reading: SET });
const FOUND = criterion("E", { kind: "measured", reading: { ...SET, mode: "found" } });

// Source of every row: product, "Task and sign-off".
test.each([
  ["every required criterion met", task(A, OPTIONAL), [put("A", "met"), put("B", "met")], "met", []],
  ["an optional one not yet", task(A, OPTIONAL), [put("A", "met"), put("B", "not_yet")], "met", []],
  ["an optional one not seen", task(A, OPTIONAL), [put("A", "met"), put("B", "not_seen")], "met", []],
  ["a required one not yet", task(A, OPTIONAL), [put("A", "not_yet"), put("B", "met")], "not_yet", ["A"]],
  ["a required one not seen", task(A), [put("A", "not_seen")], "not_yet", ["A"]],
  ["safety-critical counts though its author ticked optional", task(A, CRITICAL), [put("A", "met"), put("C", "not_yet")], "not_yet", ["C"]],
  ["safety-critical not seen", task(CRITICAL), [put("C", "not_seen")], "not_yet", ["C"]],
  ["met only after a prompt is still met: the level shows it", task(A), [put("A", "met", undefined, { prompts: 2 })], "met", []],
  ["a set reading inside its limits", task(MEASURED), [put("D", "met", 25)], "met", []],
  ["a set reading outside, though ticked met", task(MEASURED), [put("D", "met", 27)], "not_yet", ["D"]],
  ["a set reading inside, but not yet for another reason", task(MEASURED), [put("D", "not_yet", 25)], "not_yet", ["D"]],
  ["a reading that was asked for and not taken", task(MEASURED), [put("D", "met")], "not_yet", ["D"]],
  ["a found reading that was not taken", task(FOUND), [put("E", "met")], "not_yet", ["E"]],
  ["a found reading outside, rightly judged", task(FOUND), [put("E", "met", 27)], "met", []],
  ["a found reading inside, wrongly judged", task(FOUND), [put("E", "not_yet", 25)], "not_yet", ["E"]],
] as const)("%s", (_name, content, marks, outcome, keys) => {
  const computed = observationOutcome(content, [...marks], null);
  expect(computed.outcome).toBe(outcome);
  expect(computed.reasons.map((reason) => reason.key)).toEqual(keys);
  expect(computed.missing).toEqual([]);
});

test("an instrument past its date makes no criterion met", () => {
  const reading = { value: 25, unit: "N·m", instrumentId: "i", instrumentInDate: false };
  expect(observationOutcome(task(MEASURED), [put("D", "met", 25, { reading })], null).outcome).toBe("not_yet");
});

test("what nothing was put down for is missing, optional or not, and the sheet is not met", () => {
  const computed = observationOutcome(task(A, OPTIONAL, CRITICAL), [put("A", "met"), put("B", null)], null);
  expect(computed).toEqual({ outcome: "not_yet", reasons: [], missing: ["B", "C"] });
});

test("stopped for safety is not yet whatever was met before, and the rest need not be filled in", () => {
  const computed = observationOutcome(task(A, CRITICAL), [put("A", "met")], "The stands were not locked.");
  expect(computed.outcome).toBe("not_yet");
  expect(computed.missing).toEqual([]);
  expect(computed.reasons).toEqual([{ key: "", text: "Stopped for safety: The stands were not locked." }]);
});

test("each reason names its criterion, says why, and carries the assessor's remark", () => {
  const marks = [put("A", "not_yet", undefined, { remark: "Hose hung free." }), put("D", "met", 27.5)];
  expect(observationOutcome(task(A, MEASURED), marks, null).reasons).toEqual([
    { key: "A", text: "Criterion A: not yet. Hose hung free." },
    { key: "D", text: "Criterion D: 1.5\u202fN·m over: outside the limits, so this is not met." },
  ]);
});

test("a mark for a criterion that the task doesn't have changes nothing", () => {
  expect(observationOutcome(task(A), [put("A", "met"), put("Z", "not_yet")], null).outcome).toBe("met");
});

test("no sheet is met with a required or safety-critical criterion that is anything but met", () => {
  const rows = fc.array(fc.record({ required: fc.boolean(), safetyCritical: fc.boolean(), mark: fc.constantFrom(...MARKS, null) }), { minLength: 1, maxLength: 20 });
  fc.assert(
    fc.property(rows, (sheet) => {
      const content = task(...sheet.map((row, index) => criterion(String(index), row)));
      const computed = observationOutcome(content, sheet.map((row, index) => put(String(index), row.mark)), null);
      const filled = sheet.every((row) => row.mark !== null);
      const demanded = sheet.filter((row) => row.required || row.safetyCritical);
      expect(computed.outcome === "met").toBe(filled && demanded.every((row) => row.mark === "met"));
    }),
  );
});
