import { getDb } from "@/db/client";
import { findAssignmentForUpdate, findAttempt, findMark, insertAnswer } from "@/db/queries/learning";
import { AppError } from "@/lib/core/errors";
import { unmapAnswer } from "@/lib/core/questions/ask-question";
import { markAnswer } from "@/lib/core/questions/mark-answer";
import type { Marked, Question } from "@/lib/core/questions/types";
import type { Actor } from "@/lib/core/roles";
import type { AnswerQuestionInput, LearningProgress, MarkedAnswer } from "@/lib/schemas/assignments";
import { settleProgress } from "@/lib/services/learning/learning-progress";
import { myAssignment } from "@/lib/services/learning/my-assignment";

/**
 * Marks an answer and keeps it. An attempt takes one answer; sent again (a second tab, a lost connection) it gives the first one's mark.
 * @throws AppError("not_found" | "forbidden" | "gone" | "invalid_input" for ids that are not this attempt's)
 */
export async function answer(actor: Actor, assignmentId: string, input: AnswerQuestionInput): Promise<MarkedAnswer> {
  return getDb().transaction(async (trx) => {
    const assignment = myAssignment(actor, await findAssignmentForUpdate(trx, actor.organisation.id, assignmentId));
    const attempt = await findAttempt(trx, assignmentId, input.attemptId);
    const question = assignment.content.questions.find((candidate) => candidate.id === attempt?.questionId);
    if (!attempt || !question) throw new AppError("not_found", "That question was not asked here. Ask it again.");

    const earlier = await findMark(trx, attempt.id);
    if (earlier) return toAnswer(question, earlier, await settleProgress(trx, assignment));
    const given = unmapAnswer(input.given, attempt.idMap);
    if (!given || given.kind !== question.body.kind) throw new AppError("invalid_input", "This answer belongs to another asking of the question.");
    const marked = markAnswer(question, given);
    await insertAnswer(trx, {
      attemptId: attempt.id,
      organisationId: assignment.organisationId,
      assignmentId,
      questionId: question.id,
      given,
      marked,
    });
    return toAnswer(question, marked, await settleProgress(trx, assignment));
  });
}

/** The explanation gives the answer away, so it comes only once the answer was right. */
function toAnswer(question: Question, marked: Marked, progress: LearningProgress): MarkedAnswer {
  return {
    right: marked.right,
    why: marked.right ? question.explanation || marked.diagnosis : marked.diagnosis,
    lookAgainMs: marked.right ? null : question.lookAgainMs,
    knowledge: progress.knowledge,
  };
}
