import { getDb } from "@/db/client";
import { listRenditions } from "@/db/queries/renditions";
import { findMarkedRecording, listQuestions, listSteps, type MarkedRecording } from "@/db/queries/marking";
import { assertAllowed } from "@/lib/core/decision";
import { AppError } from "@/lib/core/errors";
import type { Question } from "@/lib/core/questions/types";
import type { Actor } from "@/lib/core/roles";
import type { Step } from "@/lib/core/steps/types";
import { writeChapters } from "@/lib/core/webvtt/chapters";
import { cuePlainText } from "@/lib/core/webvtt/cue-text";
import { writeMarkingTrack } from "@/lib/core/webvtt/marking-track";
import { readVtt } from "@/lib/core/webvtt/read-vtt";
import { readStoryboard, type StoryboardTile } from "@/lib/core/webvtt/storyboard";
import { canMarkOut } from "@/lib/policies/marking";
import type { Media } from "@/lib/schemas/media";
import { signMedia } from "@/lib/services/recordings/sign-media";
import { getStore } from "@/storage/store";

export type Marking = { version: number; steps: Step[]; questions: Question[] };

async function getRecording(actor: Actor, recordingId: string): Promise<MarkedRecording> {
  assertAllowed(canMarkOut(actor));
  const recording = await findMarkedRecording(getDb(), actor.organisation.id, recordingId);
  if (!recording) throw new AppError("not_found", "There is no such recording.");
  return recording;
}

/** Steps and questions, with answers: for mentors. @throws AppError("not_found" | "forbidden") */
export async function viewMarking(actor: Actor, recordingId: string): Promise<Marking> {
  const recording = await getRecording(actor, recordingId);
  return { version: recording.version, steps: await listSteps(getDb(), recordingId), questions: await listQuestions(getDb(), recordingId) };
}

/** Steps as a chapters track. @throws AppError("not_found" | "forbidden") */
export async function viewChaptersTrack(actor: Actor, recordingId: string): Promise<string> {
  return writeChapters((await viewMarking(actor, recordingId)).steps);
}

/** Facts and questions as a metadata track. @throws AppError("not_found" | "forbidden") */
export async function viewMarkingTrack(actor: Actor, recordingId: string): Promise<string> {
  const { steps, questions } = await viewMarking(actor, recordingId);
  return writeMarkingTrack(steps, questions);
}

export type BenchView = Marking & {
  recordingId: string;
  title: string;
  durationMs: number;
  media: Media;
  captions: { startMs: number; endMs: number; text: string }[];
  storyboard: { sheet: string; tiles: StoryboardTile[] } | null;
};

/**
 * Everything that the bench shows.
 * @throws AppError("not_found" | "forbidden" | "conflict" while the recording isn't there to be played)
 */
export async function viewBench(actor: Actor, recordingId: string): Promise<BenchView> {
  const recording = await getRecording(actor, recordingId);
  const [media] = await signMedia(getDb(), actor.organisation.id, [{ id: recordingId, durationMs: recording.durationMs }]);
  if (recording.durationMs === null || !media) throw new AppError("not_found", "This recording can’t be marked out until it has been looked at.");
  const track = media.captions[0]?.vtt;
  return {
    ...(await viewMarking(actor, recordingId)),
    recordingId,
    title: recording.title,
    durationMs: recording.durationMs,
    media,
    storyboard: await readTiles(actor, recordingId, media),
    captions: track ? readVtt(track).cues.map(({ startMs, endMs, text }) => ({ startMs, endMs, text: cuePlainText(text) })) : [],
  };
}

/** The strip of small pictures; none while it isn't made yet. */
async function readTiles(actor: Actor, recordingId: string, media: Media): Promise<BenchView["storyboard"]> {
  const track = (await listRenditions(getDb(), actor.organisation.id, [recordingId])).find((file) => file.kind === "storyboard_track");
  if (!track || !media.storyboardSheet) return null;
  const { body } = await getStore().getObject(track.storeKey);
  const chunks: Buffer[] = [];
  for await (const chunk of body) chunks.push(chunk as Buffer);
  return { sheet: media.storyboardSheet, tiles: readStoryboard(Buffer.concat(chunks).toString("utf8")) };
}
