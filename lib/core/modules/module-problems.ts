import type { ModuleContent } from "@/lib/core/modules/types";

/** What keeps a module's own content from being published, as sentences; empty when nothing does. */
export function moduleProblems(content: ModuleContent): string[] {
  const problems: string[] = [];
  if (content.title.trim() === "") problems.push("Give the module a title.");
  if (content.steps.length === 0) problems.push("Add at least one step.");
  if (content.questions.length === 0) problems.push("Ask at least one question: a film alone opens no task.");
  if (!(content.passRule.share >= 0 && content.passRule.share <= 1)) problems.push("The share of questions lies between 0 and 100 %.");
  const steps = new Map(content.steps.map((step) => [step.id, step]));
  for (const question of content.questions) {
    const step = steps.get(question.stepId);
    if (!step) problems.push(`“${question.prompt}” belongs to a step that is not in this module.`);
    else if (question.atMs < step.startMs || question.atMs > step.endMs) {
      problems.push(`“${question.prompt}” is asked outside its step “${step.title}”. Move it on the bench.`);
    }
  }
  return problems;
}
