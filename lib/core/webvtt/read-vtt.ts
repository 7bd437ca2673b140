import { WebVTTParser } from "webvtt-parser";

/** A cue as it stands in the file. Times in whole ms. `line` is the 1-based line of its timing. */
export type Cue = { id: string; startMs: number; endMs: number; text: string; line: number };

/** What is wrong with a file, and on which 1-based line. */
export type LineProblem = { line: number; message: string };

export type ReadVtt = { cues: Cue[]; problems: LineProblem[] };

/**
 * Reads a WebVTT file the way a browser does, forgiving; what an author should mend stands in `problems`.
 * @param text  the file's text; a byte order mark, CR and CRLF line ends and NUL are dealt with as the standard says
 * @source W3C WebVTT, "WebVTT file parsing"; webvtt-parser underneath
 */
export function readVtt(text: string): ReadVtt {
  const plain = text
    .replace(/^\uFEFF/, "")
    .replaceAll("\0", "\uFFFD")
    .replace(/\r\n?/g, "\n");
  const parsed = new WebVTTParser().parse(plain, "metadata");
  const timingLines = plain.split("\n").flatMap((line, index) => (line.includes("-->") ? [index + 1] : []));
  const badLines = new Set(parsed.errors.map((error) => error.line));
  // Every timing line makes a cue unless it could not be read; those that could not are in the errors.
  const readable = timingLines.length === parsed.cues.length ? timingLines : timingLines.filter((line) => !badLines.has(line));
  return {
    cues: parsed.cues.map((cue, index) => ({
      id: cue.id,
      startMs: Math.round(cue.startTime * 1000),
      endMs: Math.round(cue.endTime * 1000),
      text: cue.text,
      line: readable[index] ?? 0,
    })),
    problems: parsed.errors.map(({ line, message }) => ({ line, message })),
  };
}
