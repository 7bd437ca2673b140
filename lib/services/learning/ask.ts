import { randomBytes, randomInt, randomUUID } from "node:crypto";
import { getDb } from "@/db/client";
import { findAssignmentForUpdate, insertAttempt } from "@/db/queries/learning";
import { AppError } from "@/lib/core/errors";
import { askQuestion } from "@/lib/core/questions/ask-question";
import type { AskedQuestion } from "@/lib/core/questions/types";
import type { Actor } from "@/lib/core/roles";
import { myAssignment } from "@/lib/services/learning/my-assignment";

const chance = { id: () => randomBytes(9).toString("base64url"), number: () => randomInt(2 ** 32) / 2 ** 32 };

/**
 * Asks a question of the module anew: the answer stays here, choices go out under ids of this attempt.
 * @throws AppError("not_found" | "forbidden" | "gone")
 */
export async function ask(actor: Actor, assignmentId: string, questionId: string): Promise<AskedQuestion> {
  return getDb().transaction(async (trx) => {
    const assignment = myAssignment(actor, await findAssignmentForUpdate(trx, actor.organisation.id, assignmentId));
    const question = assignment.content.questions.find((candidate) => candidate.id === questionId);
    if (!question) throw new AppError("not_found", "There is no such question in this module.");
    const { asked, idMap } = askQuestion(question, randomUUID(), chance);
    await insertAttempt(trx, { id: asked.attemptId, organisationId: assignment.organisationId, assignmentId, questionId, idMap });
    return asked;
  });
}
