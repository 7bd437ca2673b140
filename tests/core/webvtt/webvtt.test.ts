import { createHash } from "node:crypto";
import { readFileSync } from "node:fs";
import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { overlapProblems, readChapters, writeChapters } from "@/lib/core/webvtt/chapters";
import { cuePlainText } from "@/lib/core/webvtt/cue-text";
import { readVtt } from "@/lib/core/webvtt/read-vtt";

const folder = "tests/core/vectors/webvtt";
const json = (name: string) => JSON.parse(readFileSync(`${folder}/${name}`, "utf8"));

// Source: the web platform's published file-parsing tests (see vectors/webvtt/SOURCE.md). Cue settings are not ours to read.
describe("file parsing, published vectors", () => {
  type Case = { file: string; sha256: string; signatureOk: boolean; cues: { start: number; end: number; id: string; text: string }[] };
  test.each(json("file-expected.json").cases as Case[])("$file", ({ file, sha256, signatureOk, cues }) => {
    const bytes = readFileSync(`${folder}/${file}`);
    expect(createHash("sha256").update(bytes).digest("hex")).toBe(sha256);
    const read = readVtt(bytes.toString("utf8"));
    expect(read.problems.some(({ message }) => message === "A WebVTT file begins with the word WEBVTT.")).toBe(!signatureOk);
    expect(read.cues.map(({ id, text, startMs, endMs }) => ({ id, text, startMs, endMs }))).toEqual(
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

  test.each(cases)("$file: cues that cross are told apart from cues inside another, and both are refused", ({ file, cues, overlaps }) => {
    const text = readFileSync(`${folder}/${file}`, "utf8");
    const found = overlapProblems(readVtt(text).cues).map(({ message }) => message);
    const sharesTime = cues.some((a, i) => cues.some((b, j) => i < j && a.start < b.end && b.start < a.end));
    expect(found.some((message) => / begins before the one on line \d+ ends/.test(message))).toBe(overlaps.length > 0);
    expect(found.length > 0).toBe(sharesTime);
    if (sharesTime) expect(readChapters(text, 10_000_000)).toEqual({ problems: expect.arrayContaining([expect.anything()]) });
  });

  const lineOf = (title: string) => title.split("\n").length;
  test.each<[string, string, number, string]>([
    ["out-of-order.vtt", "", 6, "This begins before the one above it."],
    ["zero-length.vtt", "", 3, "This ends before it begins."],
    ["markup-title.vtt", "", 4, "A step's name holds no markup; write &lt; for <."],
    ["same-interval.vtt", "", 6, "This step lies inside the one on line 3; steps follow one another."],
    ["no signature", "WEBVTTX\n\n00:00.000 --> 00:01.000\nOne\n", 1, "A WebVTT file begins with the word WEBVTT."],
    ["a name alone", "WEBVTT\n\nOne\n", 3, "These words stand under no time."],
    ["a comma in the time", "WEBVTT\n\n00:00,000 --> 00:01,000\nOne\n", 3, 'No decimal separator (".") found.'],
    ["a time without a name", "WEBVTT\n\n00:00.000 --> 00:01.000\n", 3, "This step has no name."],
    ["a name of spaces", "WEBVTT\n\n00:00.000 --> 00:01.000\n&nbsp; \n", 3, "This step has no name."],
    ["a name of two lines", "WEBVTT\n\n00:00.000 --> 00:01.000\nOne\nTwo\n", 5, "A step's name is one line."],
    ["a long name", `WEBVTT\n\n00:00.000 --> 00:01.000\n${"x".repeat(201)}\n`, 4, "A step's name has at most 200 characters."],
    ["an id twice", "WEBVTT\n\na\n00:00.000 --> 00:01.000\nOne\n\na\n00:01.000 --> 00:02.000\nTwo\n", 7, "The id “a” was given above line 4 already."],
    ["a missing blank line", "WEBVTT\n\n00:00.000 --> 00:01.000\nOne\n00:01.000 --> 00:02.000\nTwo\n", 5, "Before this time a blank line is missing."],
  ])("%s is refused with its line", (name, given, line, message) => {
    const text = given === "" ? readFileSync(`${folder}/chapters/${name}`, "utf8") : given;
    expect(lineOf(text)).toBeGreaterThanOrEqual(line);
    expect(readChapters(text, 10_000_000)).toEqual({ problems: [{ line, message }] });
  });

  test("no steps is a file too", () => expect(readChapters(writeChapters([]), 1000)).toEqual({ chapters: [] }));

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
    const title = fc.string({ minLength: 1, maxLength: 60 }).filter((text) => text.trim() === text && !/[\r\n\0\t\f]/.test(text));
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
