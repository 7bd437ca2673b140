import { getDb } from "@/db/client";
import { findRecordingForUpdate, putCaptions } from "@/db/queries/recordings";
import { AppError } from "@/lib/core/errors";
import type { Actor } from "@/lib/core/roles";
import { readCaptions } from "@/lib/core/webvtt/captions";
import { readVtt } from "@/lib/core/webvtt/read-vtt";
import { measured, workOn } from "@/lib/services/recordings/work-on";

/**
 * Takes in captions from WebVTT or SubRip text, in place of earlier ones in that language: whole or not at all.
 * @throws AppError("forbidden" | "not_found"; "conflict" before the film is measured; "invalid_input" with a problem for each line)
 */
export async function importCaptions(actor: Actor, recordingId: string, input: { language: string; text: string }): Promise<{ cues: number }> {
  return getDb().transaction(async (trx) => {
    const recording = workOn(actor, await findRecordingForUpdate(trx, actor.organisation.id, recordingId));
    const read = readCaptions(input.text, measured(recording));
    if ("problems" in read) {
      const problems = read.problems.map(({ line, message }) => ({ path: `line ${line}`, message }));
      throw new AppError("invalid_input", "The captions were not taken in. Nothing was changed.", problems);
    }
    await putCaptions(trx, { recordingId: recording.id, language: input.language, vtt: read.vtt });
    return { cues: readVtt(read.vtt).cues.length };
  });
}
