import fc from "fast-check";
import { expect, test } from "vitest";
import { readCaptions, srtToVtt, writeCaptions } from "@/lib/core/webvtt/captions";
import { cuePlainText } from "@/lib/core/webvtt/cue-text";
import { readVtt } from "@/lib/core/webvtt/read-vtt";

const said = (vtt: string) => readVtt(vtt).cues.map(({ startMs, endMs, text }) => [startMs, endMs, cuePlainText(text)]);
const srt = (...words: string[]) => ["1", "00:00:01,000 --> 00:00:02,500", ...words, ""].join("\n");

// SubRip has no standard; its shape is common practice, no source.
test.each<[string, string, [number, number, string][]]>([
  [
    "CRLF and counters",
    "1\r\n00:00:01,000 --> 00:00:02,500\r\nLoosen the bolts\r\n\r\n2\r\n00:00:03,000 --> 00:00:04,000\r\nRaise it\r\n",
    [
      [1000, 2500, "Loosen the bolts"],
      [3000, 4000, "Raise it"],
    ],
  ],
  ["a byte order mark and a blank line in front", `\uFEFF\n${srt("Raise it")}`, [[1000, 2500, "Raise it"]]],
  ["hours of one digit, a point, and a place", "1\n0:00:01.000 --> 0:00:02.500 X1:10 X2:20\nRaise it\n", [[1000, 2500, "Raise it"]]],
  ["two lines", srt("Raise it", "to 100 mm"), [[1000, 2500, "Raise it\nto 100 mm"]]],
  ["bold and coloured words", srt('<b>Stop</b> <font color="#f00">here</font>'), [[1000, 2500, "Stop here"]]],
  ["a less-than sign that is none of its tags", srt("Below < 22 mm it goes > R&D"), [[1000, 2500, "Below < 22 mm it goes > R&D"]]],
  ["an arrow in the words", srt("left --> right"), [[1000, 2500, "left --> right"]]],
  ["a placing mark", srt("{\\an8}Raise it"), [[1000, 2500, "Raise it"]]],
])("SubRip with %s becomes WebVTT", (_, text, expected) => {
  expect(said(srtToVtt(text))).toEqual(expected);
  expect(readVtt(srtToVtt(text)).problems).toEqual([]);
});

test("WebVTT is taken as it is", () => {
  const vtt = "WEBVTT\n\n00:01.000 --> 00:02.000\n<v Mentor>Raise it\n";
  expect(readCaptions(vtt, 5000)).toEqual({ vtt });
});

test.each<[string, string, number, string]>([
  ["words that are no captions", "plain words", 1, "These words stand under no time."],
  ["nothing", "", 1, "There are no captions in this file."],
  ["a caption after the film, in WebVTT", "WEBVTT\n\n00:06.000 --> 00:07.000\nLate\n", 3, "This caption begins after the end of the film."],
  ["a caption after the film, in SubRip", "1\n00:00:06,000 --> 00:00:07,000\nLate\n", 2, "This caption begins after the end of the film."],
  ["a time that ends before it begins", "\n\n1\n00:00:03,000 --> 00:00:02,000\nBack\n", 4, "This ends before it begins."],
])("%s: refused with the line of the file that was given", (_, text, line, message) => {
  expect(readCaptions(text, 5000)).toEqual({ problems: [{ line, message }] });
});

test("captions that were written say the same when they are read", () => {
  const line = fc.string({ unit: "binary", minLength: 1, maxLength: 40 }).filter((text) => text.trim() !== "" && !/[\r\n\0]/.test(text));
  const caption = fc.record({ startMs: fc.nat(90_000), lengthMs: fc.integer({ min: 1, max: 9000 }), lines: fc.array(line, { minLength: 1, maxLength: 3 }) });
  fc.assert(
    fc.property(fc.array(caption, { maxLength: 10 }), (list) => {
      const captions = list
        .toSorted((a, b) => a.startMs - b.startMs || b.lengthMs - a.lengthMs)
        .map(({ startMs, lengthMs, lines }) => ({ startMs, endMs: startMs + lengthMs, text: lines.join("\n") }));
      const vtt = writeCaptions(captions);
      expect(readVtt(vtt).problems).toEqual([]);
      expect(said(vtt)).toEqual(captions.map(({ startMs, endMs, text }) => [startMs, endMs, text]));
    }),
  );
});

test("a blank line in a caption doesn't end it", () => {
  expect(said(writeCaptions([{ startMs: 0, endMs: 1000, text: "one\n\n \r\ntwo" }]))).toEqual([[0, 1000, "one\ntwo"]]);
});
