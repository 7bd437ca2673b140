import type { TaskRule } from "@/lib/core/tasks/types";

/** What is missing before somebody can say "ready": the rule, practice and evidence, as sentences. Empty when nothing is. */
export function readyProblems(
  rule: Pick<TaskRule, "practiceRuns" | "evidencePhotos">,
  progress: { hasModule: boolean; knowledgeMet: boolean; practiceRuns: number; evidencePhotos: number },
): string[] {
  const more = (have: number, need: number, one: string, many: string) => {
    const left = need - have;
    return left > 0 ? [`${left} more ${left === 1 ? one : many}.`] : [];
  };
  return [
    ...(progress.hasModule && !progress.knowledgeMet ? ["Learn the module that opens this task."] : []),
    ...more(progress.practiceRuns, rule.practiceRuns, "practice run", "practice runs"),
    ...more(progress.evidencePhotos, rule.evidencePhotos, "photo of your work", "photos of your work"),
  ];
}
