import { getDb } from "@/db/client";
import { listCaptions } from "@/db/queries/renditions";
import { AppError } from "@/lib/core/errors";
import type { Actor } from "@/lib/core/roles";
import { writeChapters } from "@/lib/core/webvtt/chapters";
import { writeMarkingTrack } from "@/lib/core/webvtt/marking-track";
import { viewMarking } from "@/lib/services/marking/view-marking";

/** Steps as a WebVTT chapters track. @throws AppError("not_found" | "forbidden") */
export async function viewChaptersTrack(actor: Actor, recordingId: string): Promise<string> {
  return writeChapters((await viewMarking(actor, recordingId)).steps);
}

/** Facts and questions as a WebVTT metadata track, with answers. @throws AppError("not_found" | "forbidden") */
export async function viewMarkingTrack(actor: Actor, recordingId: string): Promise<string> {
  const { steps, questions } = await viewMarking(actor, recordingId);
  return writeMarkingTrack(steps, questions);
}

/** Captions as they were taken in; of several languages the first. @throws AppError("not_found" | "forbidden") */
export async function viewCaptionsTrack(actor: Actor, recordingId: string): Promise<string> {
  await viewMarking(actor, recordingId);
  const [track] = await listCaptions(getDb(), [recordingId]);
  if (!track) throw new AppError("not_found", "This recording has no captions yet.");
  return track.vtt;
}
