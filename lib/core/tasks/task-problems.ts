import { CRITERION_KINDS, LEVELS, type Criterion, type LevelNeed, type ReadingSpec, type TaskContent, type TaskRule } from "@/lib/core/tasks/types";
import { findUnit } from "@/lib/core/units/units";

/** What keeps a task from being published, as sentences; empty when nothing does. */
export function taskProblems(content: TaskContent): string[] {
  const { criteria } = content;
  return [
    ...when(content.title.trim() === "", "Give the task a title."),
    ...when(content.shortTitle.trim() === "", "Give the task a short title for the plate."),
    ...when(!criteria.some((criterion) => criterion.required || criterion.safetyCritical), "Add at least one required criterion: with none, nothing would have to be met."),
    ...when(new Set(criteria.map((criterion) => criterion.key)).size < criteria.length, "Two criteria bear the same key."),
    ...criteria.flatMap(criterionProblems),
    ...ruleProblems(content.rule),
  ];
}

const when = (wrong: boolean, sentence: string): string[] => (wrong ? [sentence] : []);

function criterionProblems(criterion: Criterion): string[] {
  const name = criterion.text.trim() === "" ? `Criterion ${criterion.key}` : `“${criterion.text}”`;
  return [
    ...when(criterion.key.trim() === "", "A criterion has no key."),
    ...when(!CRITERION_KINDS.includes(criterion.kind), `${name}: say whether it is seen, measured, asked or inspected.`),
    ...when(criterion.text.trim() === "", `${name}: say what is looked at.`),
    ...when(criterion.metLooksLike.trim() === "", `${name}: say what met looks like, so that two assessors see the same.`),
    ...when(criterion.kind === "measured" && criterion.reading === null, `${name}: say which reading is taken.`),
    ...(criterion.reading === null ? [] : readingProblems(name, criterion.reading)),
  ];
}

function readingProblems(name: string, { unit, lower, upper, resolution }: ReadingSpec): string[] {
  return [
    ...when(findUnit(unit) === undefined, `${name}: “${unit}” is not a unit that Witnessline knows.`),
    ...when(lower === null && upper === null, `${name}: give a lower or an upper limit.`),
    ...when([lower, upper].some((limit) => limit !== null && !Number.isFinite(limit)), `${name}: a limit is a number.`),
    ...when(lower !== null && upper !== null && lower > upper, `${name}: the lower limit lies above the upper one.`),
    ...when(!(resolution > 0), `${name}: give the smallest step that the instrument shows.`),
  ];
}

const isCount = (n: number, atLeast: number): boolean => Number.isInteger(n) && n >= atLeast;

function ruleProblems(rule: TaskRule): string[] {
  return [
    ...when(!isCount(rule.practiceRuns, 0), "The number of practice runs is a whole number, or none."),
    ...when(!isCount(rule.evidencePhotos, 0), "The number of photos is a whole number, or none."),
    ...when(!isCount(rule.currencyMonths, 1), "Say for how many months a sign-off stays current."),
    ...when(rule.minimumAgeAlone !== null && !isCount(rule.minimumAgeAlone, 1), "The age is in whole years."),
    ...when(rule.licence?.trim() === "", "Name the licence, or ask for none."),
    ...needsProblems(rule.levelNeeds),
  ];
}

/** A need can't ask for more vehicles than observations, and a higher level never asks for less than a lower one. */
function needsProblems(needs: LevelNeed[]): string[] {
  const sorted = needs.toSorted((a, b) => a.level - b.level);
  return sorted.flatMap((need, index) => {
    const lower = sorted[index - 1];
    const counts = [need.observations, need.vehicles, need.assessors];
    return [
      ...when(!LEVELS.includes(need.level), `There is no level ${need.level}.`),
      ...when(lower?.level === need.level, `What level ${need.level} needs is said twice.`),
      ...when(!counts.every((n) => isCount(n, 0)), `What level ${need.level} needs is counted in whole numbers.`),
      ...when(need.vehicles > need.observations || need.assessors > need.observations, `Level ${need.level} needs more vehicles or assessors than observations.`),
      ...when(
        lower !== undefined && (need.observations < lower.observations || need.vehicles < lower.vehicles || need.assessors < lower.assessors),
        `Level ${need.level} needs less than the level below it.`,
      ),
    ];
  });
}
