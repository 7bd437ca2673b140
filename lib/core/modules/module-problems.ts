import type { ModuleContent } from "@/lib/core/modules/types";
import { questionProblems } from "@/lib/core/questions/question-problems";

/** What keeps a module's own content from being published, as sentences; empty when nothing does. */
export function moduleProblems(content: ModuleContent): string[] {
  const problems: string[] = [];
  if (content.title.trim() === "") problems.push("Give the module a title.");
  if (content.steps.length === 0) problems.push("Add at least one step.");
  if (content.questions.length === 0) problems.push("Ask at least one question: a film alone opens no task.");
  if (!(content.passRule.share >= 0 && content.passRule.share <= 1)) problems.push("The share of questions lies between 0 and 100 %.");
  const steps = new Map(content.steps.map((step) => [step.id, step]));
  if (steps.size < content.steps.length) problems.push("A step can stand in a module once.");
  for (const question of content.questions) {
    const name = question.prompt.trim() === "" ? "A question" : `“${question.prompt}”`;
    problems.push(...questionProblems(question, steps.get(question.stepId)).map((problem) => `${name}: ${problem}`));
  }
  return problems;
}
