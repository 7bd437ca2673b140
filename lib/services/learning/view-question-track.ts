import { getDb } from "@/db/client";
import { findAssignment } from "@/db/queries/learning";
import { AppError } from "@/lib/core/errors";
import type { Actor } from "@/lib/core/roles";
import { writeStrippedTrack } from "@/lib/core/webvtt/stripped-track";
import { myAssignment, recordingIdsOf } from "@/lib/services/learning/my-assignment";

/**
 * When the player must stop in one recording: ids and times, nothing else.
 * @throws AppError("not_found" | "forbidden" | "gone")
 */
export async function viewQuestionTrack(actor: Actor, assignmentId: string, recordingId: string): Promise<string> {
  const assignment = myAssignment(actor, await findAssignment(getDb(), actor.organisation.id, assignmentId));
  if (!recordingIdsOf(assignment).includes(recordingId)) throw new AppError("not_found", "That film is not part of this module.");
  const stepIds = new Set(assignment.content.steps.filter((step) => step.recordingId === recordingId).map((step) => step.id));
  return writeStrippedTrack(assignment.content.questions.filter((question) => stepIds.has(question.stepId)));
}
