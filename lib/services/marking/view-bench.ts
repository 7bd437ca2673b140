import { getDb } from "@/db/client";
import { findMarkedRecording } from "@/db/queries/marking";
import { listRenditions } from "@/db/queries/renditions";
import { assertAllowed } from "@/lib/core/decision";
import { AppError } from "@/lib/core/errors";
import type { Actor } from "@/lib/core/roles";
import { cuePlainText } from "@/lib/core/webvtt/cue-text";
import { readVtt } from "@/lib/core/webvtt/read-vtt";
import { readStoryboard, type StoryboardTile } from "@/lib/core/webvtt/storyboard";
import { canMarkOut } from "@/lib/policies/marking";
import type { MarkingView } from "@/lib/schemas/marking";
import type { Media } from "@/lib/schemas/media";
import { viewMarking } from "@/lib/services/marking/view-marking";
import { signMedia } from "@/lib/services/recordings/sign-media";
import { getStore } from "@/storage/store";

/** `film` is null until the film was measured: before that, no time on it means anything. */
export type BenchView = {
  title: string;
  film: {
    durationMs: number;
    marking: MarkingView;
    source: string | null;
    poster: string | null;
    captions: { startMs: number; endMs: number; text: string }[];
    storyboard: { sheet: string; tiles: StoryboardTile[] } | null;
  } | null;
};

/** Everything that the bench shows, with signed addresses of the film. @throws AppError("not_found" | "forbidden") */
export async function viewBench(actor: Actor, recordingId: string): Promise<BenchView> {
  assertAllowed(canMarkOut(actor));
  const recording = await findMarkedRecording(getDb(), actor.organisation.id, recordingId);
  if (!recording) throw new AppError("not_found", "There is no such recording.");
  const { title, durationMs } = recording;
  const [media] = await signMedia(getDb(), actor.organisation.id, [{ id: recordingId, durationMs }]);
  if (durationMs === null || !media) return { title, film: null };
  const captions = readVtt(media.captions[0]?.vtt ?? "WEBVTT\n").cues;
  return {
    title,
    film: {
      durationMs,
      marking: await viewMarking(actor, recordingId),
      source: media.p480 ?? media.p720,
      poster: media.poster,
      captions: captions.map(({ startMs, endMs, text }) => ({ startMs, endMs, text: cuePlainText(text) })),
      storyboard: await readTiles(actor, recordingId, media),
    },
  };
}

/** The strip of small pictures; none while it isn't made yet or can't be had: the bench works without it. */
async function readTiles(actor: Actor, recordingId: string, media: Media): Promise<{ sheet: string; tiles: StoryboardTile[] } | null> {
  const track = (await listRenditions(getDb(), actor.organisation.id, [recordingId])).find((file) => file.kind === "storyboard_track");
  if (!track || !media.storyboardSheet) return null;
  try {
    const { body } = await getStore().getObject(track.storeKey);
    const chunks: Buffer[] = [];
    for await (const chunk of body) chunks.push(chunk as Buffer);
    return { sheet: media.storyboardSheet, tiles: readStoryboard(Buffer.concat(chunks).toString("utf8")) };
  } catch (error) {
    if (error instanceof AppError) return null;
    throw error;
  }
}
