import fc from "fast-check";
import { describe, expect, test } from "vitest";
import type { Question } from "@/lib/core/questions/types";
import { NO_FACTS, type Step } from "@/lib/core/steps/types";
import { readMarkingTrack, writeMarkingTrack } from "@/lib/core/webvtt/marking-track";
import { writeStrippedTrack } from "@/lib/core/webvtt/stripped-track";

describe("the metadata track of facts and questions", () => {
  const step: Step = { id: "s1", title: "Wheel off", startMs: 0, endMs: 5000, facts: { ...NO_FACTS, tools: ["hook --> never the hose"] } };
  const question: Question = {
    id: "q1",
    stepId: "s1",
    atMs: 5000,
    prompt: "Which way --> or <-- ?\n\nNext line",
    explanation: "",
    lookAgainMs: 0,
    safetyCritical: true,
    body: { kind: "number", unit: "mm", value: 0.05, tolerance: 0.005, slips: [] },
  };

  test("an arrow inside JSON is escaped, and everything comes back", () => {
    const text = writeMarkingTrack([step], [question]);
    expect(text.split("\n").filter((line) => line.includes("-->"))).toHaveLength(2);
    const read = readMarkingTrack(text, 5000);
    const { id: _, atMs, ...rest } = question;
    expect("cues" in read && read.cues.map((cue) => [cue.id, cue.startMs, cue.json])).toEqual([
      ["facts s1", 0, { kind: "facts", stepId: "s1", facts: step.facts }],
      ["q1", atMs, { kind: "question", ...rest }],
    ]);
  });

  // Any text at all may stand in a fact or a prompt: arrows, line ends, markup, NUL, other scripts.
  const words = fc.oneof(fc.string({ unit: "binary", maxLength: 30 }), fc.constantFrom("-->", "--->", "a\n\nb", "NOTE", "WEBVTT", "<b>&amp;", "\\u003e"));
  const facts = fc.record({ tools: fc.array(words, { maxLength: 3 }), parts: fc.array(words, { maxLength: 3 }) });
  const marks = fc.array(fc.record({ lengthMs: fc.integer({ min: 1, max: 90_000 }), facts, prompts: fc.array(words, { maxLength: 3 }) }), { maxLength: 8 });

  test("what we wrote comes back whole, and is written again byte for byte", () => {
    fc.assert(
      fc.property(marks, (list) => {
        let at = 0;
        const steps = list.map(({ lengthMs, facts: some }, index): Step => {
          const startMs = at;
          at += lengthMs;
          return { id: `s${index}`, title: "", startMs, endMs: at, facts: { ...NO_FACTS, ...some } };
        });
        const questions = steps.flatMap(({ id, startMs }, index) =>
          (list[index]?.prompts ?? []).map((prompt, n): Question => ({ ...question, id: `${id}/${n}`, stepId: id, atMs: startMs, prompt })),
        );
        const text = writeMarkingTrack(steps, questions);
        const read = readMarkingTrack(text, at);
        if (!("cues" in read)) throw new Error(JSON.stringify(read.problems));
        const json = read.cues.map((cue) => cue.json as { kind: string; facts: Step["facts"] });
        const factsBack = steps.map((step) => ({ ...step, facts: json.find((found) => found.kind === "facts" && (found as { stepId?: string }).stepId === step.id)?.facts ?? NO_FACTS }));
        const questionsBack = read.cues.flatMap(({ id, startMs, json: body }) => {
          const { kind, ...rest } = body as { kind: string } & Omit<Question, "id" | "atMs">;
          return kind === "question" ? [{ ...rest, id, atMs: startMs }] : [];
        });
        expect(factsBack).toEqual(steps);
        expect(questionsBack).toEqual(questions);
        expect(writeMarkingTrack(factsBack, questionsBack)).toBe(text);
      }),
    );
  });

  test("an id that stands twice is refused", () => {
    const cue = (from: string) => `\nq1\n${from} --> 00:09.000\n{}\n`;
    expect(readMarkingTrack(`WEBVTT\n${cue("00:00.000")}${cue("00:01.000")}`, 9000)).toEqual({
      problems: [{ line: 7, message: "The id “q1” was given above line 4 already." }],
    });
  });

  test("what begins after the film is refused", () => {
    expect(readMarkingTrack("WEBVTT\n\n00:06.000 --> 00:07.000\n{}\n", 5000)).toEqual({
      problems: [{ line: 3, message: "This begins after the end of the film (00:00:05.000)." }],
    });
  });

  test("text that is not JSON is refused with its line", () => {
    expect(readMarkingTrack("WEBVTT\n\n00:00.000 --> 00:01.000\n{oops\n", 5000)).toEqual({
      problems: [{ line: 4, message: "The text under this time is not JSON." }],
    });
  });

  test("a player's track says when, and nothing else", () => {
    const text = writeStrippedTrack([question]);
    expect(text).toBe('WEBVTT\n\nq1\n00:00:05.000 --> 00:00:05.001\n{"kind":"question"}\n');
  });
});
