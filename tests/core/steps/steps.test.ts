import { readFileSync } from "node:fs";
import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { SIGNS } from "@/lib/core/steps/iso-7010";
import { stepPublishProblems } from "@/lib/core/steps/publish-problems";
import { stepProblems } from "@/lib/core/steps/step-problems";
import { NO_FACTS, type Caution, type Fastener, type StepFacts } from "@/lib/core/steps/types";

const step = (title: string, startMs: number, endMs: number) => ({ title, startMs, endMs });

describe("steps of one recording", () => {
  test.each<[string, ReturnType<typeof step>[], string[]]>([
    ["none", [], []],
    ["one after the other, with a gap", [step("A", 0, 1000), step("B", 1000, 2000), step("C", 5000, 10_000)], []],
    ["no name", [step(" ", 0, 1000)], ["A step has no name."]],
    ["no length", [step("A", 1000, 1000)], ["“A” ends before it begins."]],
    ["before the film", [step("A", -1, 1000)], ["“A” begins before the film."]],
    ["past the end by a millisecond", [step("A", 0, 10_001)], ["“A” runs past the end of the film."]],
    ["half a millisecond", [step("A", 0, 10.5)], ["“A” does not begin and end on a whole millisecond."]],
    ["overlap by a millisecond", [step("A", 0, 1001), step("B", 1000, 2000)], ["“B” begins before “A” ends."]],
    [
      "two inside a long one",
      [step("A", 0, 9000), step("B", 1000, 2000), step("C", 3000, 4000)],
      ["“B” begins before “A” ends.", "“C” begins before “A” ends."],
    ],
  ])("%s", (_, steps, problems) => expect(stepProblems(steps, 10_000)).toEqual(problems));

  test("an overlap is told exactly where two steps share time, in whatever order they come", () => {
    const span = fc.tuple(fc.nat(50), fc.integer({ min: 1, max: 20 }));
    fc.assert(
      fc.property(fc.array(span, { maxLength: 6 }), (spans) => {
        const steps = spans.map(([startMs, length], index) => step(`S${index}`, startMs, startMs + length));
        const share = steps.some((a, i) => steps.some((b, j) => i < j && a.startMs < b.endMs && b.startMs < a.endMs));
        expect(stepProblems(steps, 100).length > 0).toBe(share);
      }),
    );
  });
});

const fastener = (source: string, newtonMetres = 105): Fastener => ({
  id: "f",
  name: "Carrier bolt",
  count: 2,
  acrossFlatsMm: 18,
  oneTimeUse: true,
  tightening: { entered: "105 Nm", newtonMetres, angleDegrees: null, source },
});
const caution = (change: Partial<Caution>): Caution => ({ id: "c", grade: "warning", sign: "W024", hazard: "Hands under the pad", instruction: "Lower it slowly.", waitSeconds: null, ...change });

test.each<[string, Partial<StepFacts>, string[]]>([
  ["nothing at all", {}, []],
  ["a value with its source", { fasteners: [fastener("maker's data for this vehicle")] }, []],
  ["a fastener without a value", { fasteners: [{ ...fastener(""), tightening: null }] }, []],
  ["a value without a source", { fasteners: [fastener(" ")] }, ["“Tighten”: say where the tightening value of “Carrier bolt” comes from."]],
  ["a value that was not understood", { fasteners: [fastener("maker's data", 0)] }, ["“Tighten”: the tightening value of “Carrier bolt” is not understood."]],
  ["a caution", { cautions: [caution({})] }, []],
  ["a sign that doesn't exist", { cautions: [caution({ sign: "W999" })] }, ["“Tighten”: the sign W999 of “Hands under the pad” is not on the list."]],
  ["a name that every object has", { cautions: [caution({ sign: "constructor" })] }, ["“Tighten”: the sign constructor of “Hands under the pad” is not on the list."]],
  ["a caution without an instruction", { cautions: [caution({ instruction: "" })] }, ["“Tighten”: the caution “Hands under the pad” does not say what to do."]],
  ["a fault code", { faultCodes: ["P0301"] }, []],
  ["no fault code", { faultCodes: ["P9999"] }, ["“Tighten”: “P9999” is not a fault code."]],
])("publishing a step with %s", (_, facts, problems) => {
  expect(stepPublishProblems({ title: "Tighten", facts: { ...NO_FACTS, ...facts } })).toEqual(problems);
});

// Source: vectors/vehicle/iso-7010.json, ids and titles as a public list gives them (not the standard itself).
describe("signs", () => {
  const listed = new Map((JSON.parse(readFileSync("tests/core/vectors/vehicle/iso-7010.json", "utf8")).signs as { id: string; title: string }[]).map(({ id, title }) => [id, title]));
  const keyword: Record<string, RegExp> = {
    W001: /warning/, W012: /electric/, W015: /overhead load/, W017: /hot surface/, W019: /crushing/, W021: /flammable/, W023: /corrosive/, W024: /hands/, W026: /battery/, W029: /cylinder/,
    M002: /manual/, M003: /ear/, M004: /eye/, M008: /footwear/, M009: /gloves/, M010: /clothing/, M013: /face shield/, M016: /mask/, M017: /respiratory/, M021: /disconnect/,
    P002: /smoking/, P003: /open flame/,
  };
  test.each(Object.entries(SIGNS))("%s %s", (id, meaning) => {
    expect(id).toMatch(/^[WMP]\d{3}$/);
    expect(meaning).toMatch(keyword[id] ?? /^$/);
    expect(listed.get(id)?.toLowerCase()).toMatch(keyword[id] ?? /^$/);
  });
  test("every one is checked", () => expect(Object.keys(SIGNS).toSorted()).toEqual(Object.keys(keyword).toSorted()));
});
