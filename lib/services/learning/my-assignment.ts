import type { Assignment } from "@/db/queries/learning";
import { assertAllowed } from "@/lib/core/decision";
import { AppError } from "@/lib/core/errors";
import type { Actor } from "@/lib/core/roles";
import { canLearn } from "@/lib/policies/assignments";

/**
 * The assignment, if it is this apprentice's and still given.
 * @throws AppError("not_found" | "forbidden" | "gone" when it was taken back)
 */
export function myAssignment(actor: Actor, assignment: Assignment | undefined): Assignment {
  if (!assignment) throw new AppError("not_found", "There is no such module among those given to you.");
  assertAllowed(canLearn(actor, assignment));
  if (assignment.withdrawnAt) throw new AppError("gone", "This revision was replaced by a newer one. Your answers are kept; go on with the new one.");
  return assignment;
}

export const recordingIdsOf = (assignment: Assignment): string[] => [...new Set(assignment.content.steps.map((step) => step.recordingId))];
