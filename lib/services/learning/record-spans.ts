import { getDb } from "@/db/client";
import { addPlayed, findAssignmentForUpdate, listDurations, moveClock } from "@/db/queries/learning";
import { acceptSpans } from "@/lib/core/coverage/spans";
import { AppError } from "@/lib/core/errors";
import type { Actor } from "@/lib/core/roles";
import type { LearningProgress, ReportSpansInput } from "@/lib/schemas/assignments";
import { learningProgress, settleProgress } from "@/lib/services/learning/learning-progress";
import { myAssignment, recordingIdsOf } from "@/lib/services/learning/my-assignment";

/**
 * Takes a player's report and accepts of it what can have been played since the person's last report, from whatever tab or device.
 * @throws AppError("not_found" | "forbidden" | "gone")
 */
export async function recordSpans(actor: Actor, assignmentId: string, input: ReportSpansInput): Promise<LearningProgress> {
  return getDb().transaction(async (trx) => {
    const assignment = myAssignment(actor, await findAssignmentForUpdate(trx, actor.organisation.id, assignmentId));
    if (!recordingIdsOf(assignment).includes(input.recordingId)) throw new AppError("not_found", "That film is not part of this module.");
    const elapsedMs = await moveClock(trx, actor.personId);
    const durations = await listDurations(trx, assignment.organisationId, [input.recordingId]);
    const accepted = acceptSpans({ reported: input.spans, durationMs: durations.get(input.recordingId) ?? 0, elapsedMs, rate: input.rate });
    await addPlayed(trx, { assignmentId, recordingId: input.recordingId }, accepted);
    return accepted.length === 0 ? learningProgress(trx, assignment) : settleProgress(trx, assignment);
  });
}
