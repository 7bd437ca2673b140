import type { Question } from "@/lib/core/questions/types";
import { formatTimestamp } from "@/lib/core/webvtt/timestamps";

/** What an apprentice's player gets: when to stop and for which question. No prompt, no choices, no answer. */
export function writeStrippedTrack(questions: readonly Pick<Question, "id" | "atMs">[]): string {
  const cues = questions
    .toSorted((a, b) => a.atMs - b.atMs)
    .map(({ id, atMs }) => `\n${id}\n${formatTimestamp(atMs)} --> ${formatTimestamp(atMs + 1)}\n{"kind":"question"}\n`);
  return `WEBVTT\n${cues.join("")}`;
}
