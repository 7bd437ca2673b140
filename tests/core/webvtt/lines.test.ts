import { readdirSync, readFileSync } from "node:fs";
import fc from "fast-check";
import { expect, test } from "vitest";
import { readVtt } from "@/lib/core/webvtt/read-vtt";

/** Every cue's line, read by itself, must give that cue's times again. */
function linesAreTrue(text: string): void {
  const lines = text.replaceAll("\0", "\uFFFD").split(/\r\n|\r|\n/);
  for (const { line, startMs, endMs } of readVtt(text).cues) {
    const alone = readVtt(`WEBVTT\n\n${lines[line - 1] ?? ""}`).cues;
    expect(alone.map((cue) => [cue.startMs, cue.endMs])).toEqual([[startMs, endMs]]);
  }
}

// Source of the files: the published file-parsing vectors. They assert no lines; the check is that each line is the cue's own timing.
test.each(readdirSync("tests/core/vectors/webvtt/file"))("lines of %s", (file) => linesAreTrue(readFileSync(`tests/core/vectors/webvtt/file/${file}`, "utf8")));

test("lines hold in files of any mess", () => {
  const line = fc.constantFrom(
    ...["", "", "", "id", "NOTE", "NOTE x", "STYLE", "::cue {}", "WEBVTT", "text", "-->", "00:01.000-->00:02.000x", "NOTE 00:01.000 --> 00:02.000"],
    ...["00:01.000 --> 00:02.000", "00:05.000 --> 00:09.000", "00:05.000 --> 00:07.000 align:start", "1:00:00.000 --> 01:00:01.000", "\t100:00:00.000 --> 999:59:59.999"],
    ...["00:61.000 --> 00:02.000", "60:00.000 --> 61:00.000", "00:01.0000 --> 00:02.000", "00:01.000 -> 00:02.000", "100:00.000 --> 00:02.000", "00:09.000 --> 00:05.000"],
  );
  fc.assert(
    fc.property(fc.array(line, { maxLength: 14 }), (lines) => linesAreTrue(["WEBVTT", ...lines].join("\n"))),
    { numRuns: 1000 },
  );
});

test("a comment with an arrow doesn't move the lines below it", () => {
  const text = "WEBVTT\n\nNOTE\nnot --> 00:01.000\n\n00:02.000 --> 00:03.000\nOne\n";
  expect(readVtt(text)).toEqual({
    cues: [{ id: "", startMs: 2000, endMs: 3000, text: "One", line: 6 }],
    problems: [{ line: 4, message: "A time can’t stand in a comment." }],
  });
});
