import { readFileSync } from "node:fs";
import fc from "fast-check";
import { describe, expect, test } from "vitest";
import type { Question } from "@/lib/core/questions/types";
import { NO_FACTS, type Step } from "@/lib/core/steps/types";
import { readCaptions, srtToVtt } from "@/lib/core/webvtt/captions";
import { overlapProblems, readChapters, writeChapters } from "@/lib/core/webvtt/chapters";
import { cuePlainText } from "@/lib/core/webvtt/cue-text";
import { readMarkingTrack, writeMarkingTrack } from "@/lib/core/webvtt/marking-track";
import { readVtt } from "@/lib/core/webvtt/read-vtt";
import { writeStrippedTrack } from "@/lib/core/webvtt/stripped-track";
import { formatTimestamp } from "@/lib/core/webvtt/timestamps";

const folder = "tests/core/vectors/webvtt";
const json = (name: string) => JSON.parse(readFileSync(`${folder}/${name}`, "utf8"));

// Source: the web platform's published file-parsing tests (see vectors/webvtt/SOURCE.md). Cue settings are not ours to read.
describe("file parsing, published vectors", () => {
  type Case = { file: string; cues: { start: number; end: number; id: string; text: string }[] };
  test.each(json("file-expected.json").cases as Case[])("$file", ({ file, cues }) => {
    const read = readVtt(readFileSync(`${folder}/${file}`, "utf8")).cues;
    expect(read.map(({ id, text, startMs, endMs }) => ({ id, text, startMs, endMs }))).toEqual(
      cues.map(({ id, text, start, end }) => ({ id, text, startMs: Math.round(start * 1000), endMs: Math.round(end * 1000) })),
    );
  });
});

// Source: the same repository's cue-text tests; the plain title follows WebVTT, "rules for extracting the chapter title".
describe("cue text, published vectors", () => {
  type Case = { group: string; n: number; input: string; chapterTitle: string };
  test.each(json("cue-text-expected.json").cases as Case[])("$group $n", ({ input, chapterTitle }) => {
    const cueText = readVtt(`WEBVTT\n\n00:00:00.000 --> 00:00:01.000\n${input}`).cues[0]?.text ?? "";
    expect(cuePlainText(cueText)).toBe(chapterTitle);
  });
});

// Source: W3C WebVTT, chapters examples and the nesting rule (see vectors/webvtt/SOURCE.md). Our steps are flat, so nesting is refused too.
describe("chapters", () => {
  type Case = { file: string; onlyNested: boolean | null; overlaps: [number, number][]; cues: { start: number; end: number }[] };
  const cases = json("chapters-expected.json").cases as Case[];

  test.each(cases)("$file is refused exactly when two of its cues share time, or an author may not write it", ({ file, cues }) => {
    const sharesTime = cues.some((a, i) => cues.some((b, j) => i < j && a.start < b.end && b.start < a.end));
    const text = readFileSync(`${folder}/${file}`, "utf8");
    if (sharesTime) {
      expect(overlapProblems(readVtt(text).cues).length).toBeGreaterThan(0);
      expect(readChapters(text, 10_000_000)).toHaveProperty("problems");
    } else {
      expect(overlapProblems(readVtt(text).cues)).toEqual([]);
    }
  });

  test("names the line of each problem and imports nothing", () => {
    const text = "WEBVTT\n\n00:00:00.000 --> 00:00:10.000\nOne\n\n00:00:05.000 --> 00:00:20.000\nTwo\n\n00:00:20.000 --> 00:09:00.000\nThree\n";
    expect(readChapters(text, 60_000)).toEqual({
      problems: [
        { line: 6, message: "This step begins before the one on line 3 ends." },
        { line: 9, message: "This step runs past the end of the film (00:01:00.000)." },
      ],
    });
  });

  test("what was written comes back, and is written again byte for byte", () => {
    const title = fc.string({ minLength: 1, maxLength: 60 }).filter((text) => text.trim() === text && !/[\r\n\0\t\f]/.test(text) && text.isWellFormed());
    fc.assert(
      fc.property(fc.array(fc.tuple(title, fc.integer({ min: 1, max: 90_000 })), { maxLength: 20 }), (parts) => {
        let at = 0;
        const chapters = parts.map(([name, length], index) => {
          const startMs = at;
          at += length;
          return { id: `step-${index}`, title: name, startMs, endMs: at };
        });
        const text = writeChapters(chapters);
        const read = readChapters(text, at);
        expect(read).toEqual({ chapters });
        expect(writeChapters("chapters" in read ? read.chapters : [])).toBe(text);
      }),
    );
  });
});

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

// Source: W3C WebVTT, "WebVTT timestamp": two or more digits of hours.
test.each([
  [0, "00:00:00.000"],
  [213_000, "00:03:33.000"],
  [3_599_999, "00:59:59.999"],
  [360_000_001, "100:00:00.001"],
])("%i ms is written %s", (ms, text) => expect(formatTimestamp(ms)).toBe(text));

// SubRip has no standard; its shape is common practice, no source.
test("SubRip becomes WebVTT", () => {
  const srt = "1\r\n00:00:01,000 --> 00:00:02,500\r\nLoosen the bolts\r\n\r\n2\r\n00:00:03,000 --> 00:00:04,000\r\nRaise it\r\n";
  expect(readVtt(srtToVtt(srt)).cues.map(({ startMs, endMs, text }) => [startMs, endMs, text])).toEqual([
    [1000, 2500, "Loosen the bolts"],
    [3000, 4000, "Raise it"],
  ]);
  expect(readCaptions("plain words", 5000)).toHaveProperty("problems");
});
