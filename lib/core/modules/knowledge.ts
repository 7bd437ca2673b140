import type { ModuleContent } from "@/lib/core/modules/types";

/** A step counts as seen from this share of its length on (product: "Watching"). */
export const SEEN_SHARE = 0.95;

export type KnowledgeStanding = {
  met: boolean;
  stepsSeen: number;
  steps: number;
  right: number;
  questions: number;
  /** What is still missing, as sentences; empty when met. */
  missing: string[];
};

/**
 * Whether a module's knowledge rule is met: every step seen, the safety-critical questions right, and at least the rule's share of all
 * questions right. Of several answers to a question the latest counts.
 * @param latestRight  question id → whether its latest answer was right; absent when never answered
 * @param seenShare    step id → share of its length that the server accepted as played, 0–1
 */
export function knowledgeStanding(
  content: ModuleContent,
  latestRight: ReadonlyMap<string, boolean>,
  seenShare: ReadonlyMap<string, number>,
): KnowledgeStanding {
  const unseen = content.steps.filter((step) => !((seenShare.get(step.id) ?? 0) >= SEEN_SHARE));
  const right = content.questions.filter((question) => latestRight.get(question.id) === true).length;
  const questions = content.questions.length;
  const safetyOpen = content.questions.filter((question) => question.safetyCritical && latestRight.get(question.id) !== true);
  // Compared as whole questions, so that a share of 0.8 of 5 asks for 4 and not for 4.000000001.
  const needed = Math.ceil(content.passRule.share * questions - 1e-9);

  const missing: string[] = [];
  if (unseen.length > 0) missing.push(`${unseen.length} of ${content.steps.length} steps not seen to the end.`);
  if (safetyOpen.length > 0) missing.push(`${safetyOpen.length} safety-critical ${safetyOpen.length === 1 ? "question" : "questions"} not right yet.`);
  if (right < needed) missing.push(`${right} of ${questions} questions right, ${needed} needed.`);
  return { met: missing.length === 0, stepsSeen: content.steps.length - unseen.length, steps: content.steps.length, right, questions, missing };
}
