import { WebVTTParser } from "webvtt-parser";
import { timingLines } from "@/lib/core/webvtt/timing-lines";

/** A cue as it stands in the file. Times in whole ms. `line` is the 1-based line of its timing. */
export type Cue = { id: string; startMs: number; endMs: number; text: string; line: number };

/** What is wrong with a file, and on which 1-based line. */
export type LineProblem = { line: number; message: string };

export type ReadVtt = { cues: Cue[]; problems: LineProblem[] };

/**
 * Reads a WebVTT file the way a browser does, forgiving; what an author should mend stands in `problems`.
 * @param text  the file's text; a byte order mark, CR and CRLF line ends and NUL are dealt with as the standard says
 * @returns     cues by start, of those with one start the longest first
 * @source W3C WebVTT, "WebVTT file parsing"; webvtt-parser underneath
 */
export function readVtt(text: string): ReadVtt {
  const plain = text
    .replace(/^\uFEFF/, "")
    .replaceAll("\0", "\uFFFD")
    .replace(/\r\n?/g, "\n");
  const parsed = new WebVTTParser().parse(plain, "metadata");
  const timings = timingLines(plain.split("\n"));
  return {
    cues: parsed.cues.map(({ id, text: body, startTime, endTime }, index) => ({
      id,
      startMs: Math.round(startTime * 1000),
      endMs: Math.round(endTime * 1000),
      text: body,
      line: timings[index]?.line ?? 0,
    })),
    // A standalone line is told of when the parser is past it already.
    problems: parsed.errors.map(({ line, message }) => ({ line: message === STANDALONE ? line - 1 : line, message: IN_OUR_WORDS[message] ?? message })),
  };
}

const STANDALONE = "Cue identifier cannot be standalone.";

/** What authors do most, said as they would. */
const IN_OUR_WORDS: Readonly<Record<string, string>> = {
  'No valid signature. (File needs to start with "WEBVTT".)': "A WebVTT file begins with the word WEBVTT.",
  "No blank line after the signature.": "After the first line comes a blank line.",
  [STANDALONE]: "These words stand under no time.",
  "Cue identifier needs to be followed by timestamp.": "Here a time was expected.",
  "Blank line missing before cue.": "Before this time a blank line is missing.",
  "Start timestamp is not greater than or equal to start timestamp of previous cue.": "This begins before the one above it.",
  "End timestamp is not greater than start timestamp.": "This ends before it begins.",
  "Cannot have timestamp in a comment.": "A time can’t stand in a comment.",
};
