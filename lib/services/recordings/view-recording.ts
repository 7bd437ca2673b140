import { getDb } from "@/db/client";
import { findRecordingDetail } from "@/db/reads/recordings";
import type { Actor } from "@/lib/core/roles";
import type { RecordingView } from "@/lib/schemas/recordings";
import { workOn } from "@/lib/services/recordings/work-on";

/** One recording with the stages of its preparing. @throws AppError("forbidden" | "not_found") */
export async function viewRecording(actor: Actor, recordingId: string): Promise<RecordingView> {
  const { id, createdAt, privateDetailsCheckedAt, ...rest } = workOn(
    actor,
    await findRecordingDetail(getDb(), actor.organisation.id, recordingId),
  );
  return {
    ...rest,
    recordingId: id,
    createdAt: createdAt.toISOString(),
    privateDetailsCheckedAt: privateDetailsCheckedAt?.toISOString() ?? null,
  };
}
