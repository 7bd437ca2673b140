import { canonicalJson } from "@/lib/core/ledger/canonical-json";
import type { Question } from "@/lib/core/questions/types";
import type { Step } from "@/lib/core/steps/types";
import { inFileOrder, repeatedIds } from "@/lib/core/webvtt/line-problems";
import { readVtt, type LineProblem } from "@/lib/core/webvtt/read-vtt";
import { formatTimestamp } from "@/lib/core/webvtt/timestamps";

/**
 * One cue of the metadata track as read: its time, its line, and JSON that a schema has yet to check.
 * `facts` cues hold { kind: "facts", stepId, facts }; `question` cues hold a Question without its time, which is the cue's start.
 */
export type MarkingCue = { line: number; id: string; startMs: number; endMs: number; json: unknown };

/** JSON on one line that can't be taken for a timing: "-->" can only stand inside a string of it, where > may be escaped. */
const oneLine = (value: unknown): string => canonicalJson(value).replaceAll("-->", "--\\u003e");

const cue = (id: string, startMs: number, endMs: number, value: unknown): string =>
  `\n${id}\n${formatTimestamp(startMs)} --> ${formatTimestamp(endMs)}\n${oneLine(value)}\n`;

/**
 * Facts and questions as a WebVTT metadata track. Keys are in canonical order, so the same marking out is always the same bytes.
 * A question's cue lasts a millisecond: it is a moment.
 */
export function writeMarkingTrack(steps: readonly Step[], questions: readonly Question[]): string {
  const facts = steps.map((step) => ({
    at: step.startMs,
    text: cue(`facts ${step.id}`, step.startMs, step.endMs, { kind: "facts", stepId: step.id, facts: step.facts }),
  }));
  const asked = questions.map(({ id, atMs, ...rest }) => ({
    at: atMs,
    text: cue(id, atMs, atMs + 1, { kind: "question", ...rest }),
  }));
  // Stable: of two at one time, facts come before questions and questions in their own order.
  return `WEBVTT\n${[...facts, ...asked].toSorted((a, b) => a.at - b.at).map(({ text }) => text).join("")}`;
}

/**
 * Reads a metadata track as an author's file: strict about the file and its times; the JSON is for a schema to check.
 * @returns cues, or every problem with its line
 */
export function readMarkingTrack(text: string, durationMs: number): { cues: MarkingCue[] } | { problems: LineProblem[] } {
  const { cues, problems } = readVtt(text);
  const found = [...problems, ...repeatedIds(cues)];
  const read: MarkingCue[] = [];
  for (const { line, id, startMs, endMs, text: body } of cues) {
    if (startMs > durationMs) found.push({ line, message: `This begins after the end of the film (${formatTimestamp(durationMs)}).` });
    try {
      read.push({ line, id, startMs, endMs, json: JSON.parse(body) });
    } catch {
      found.push({ line: line + 1, message: "The text under this time is not JSON." });
    }
  }
  return found.length > 0 ? { problems: inFileOrder(found) } : { cues: read };
}
