import { LEVEL_LABEL, LEVELS, type Level, type TaskRule } from "@/lib/core/tasks/types";

export type LevelCap = { level: Level; reasons: string[] };

/** Highest levels while something stands against more (product: "Task and sign-off", "Safety"). */
const CAP_PROMPTED: Level = 3;
const CAP_WITHOUT_LICENCE: Level = 2;
const CAP_TOO_YOUNG: Level = 3;

/**
 * The highest supervision level that the rules allow, with a sentence for each thing that lowers it. Levels are steps, not numbers to
 * average: each cap is found by itself and the lowest holds.
 * @param of.metObservations  observations of this task that were met and stand, this one included
 * @param of.ageYears         null when the date of birth is not on record: then the age rule can't be shown to be met
 */
export function levelCap(of: {
  rule: TaskRule;
  prompted: boolean;
  metObservations: { vehicle: string; assessorId: string }[];
  licences: string[];
  ageYears: number | null;
}): LevelCap {
  const { rule } = of;
  const caps: { level: Level; reason: string }[] = [];
  if (of.prompted) caps.push({ level: CAP_PROMPTED, reason: "A criterion was met only after a prompt." });
  if (rule.licence !== null && !of.licences.includes(rule.licence)) {
    caps.push({ level: CAP_WITHOUT_LICENCE, reason: `The licence “${rule.licence}” is not on record.` });
  }
  if (rule.minimumAgeAlone !== null && (of.ageYears === null || of.ageYears < rule.minimumAgeAlone)) {
    const why = of.ageYears === null ? `No date of birth on record to show an age of ${rule.minimumAgeAlone}` : `Under ${rule.minimumAgeAlone}`;
    caps.push({ level: CAP_TOO_YOUNG, reason: `${why}: a mentor stays alongside.` });
  }
  for (const level of LEVELS) {
    const lacking = lackingFor(level, of);
    if (lacking && level > 1) {
      caps.push({ level: (level - 1) as Level, reason: `Level ${level} (${LEVEL_LABEL[level]}) needs ${lacking}.` });
      break;
    }
  }
  const level = caps.reduce<Level>((lowest, cap) => (cap.level < lowest ? cap.level : lowest), 5);
  return { level, reasons: caps.filter((cap) => cap.level < 5).map((cap) => cap.reason) };
}

function lackingFor(level: Level, of: { rule: TaskRule; metObservations: { vehicle: string; assessorId: string }[] }): string | null {
  const need = of.rule.levelNeeds.find((candidate) => candidate.level === level);
  if (!need) return null;
  const vehicles = new Set(of.metObservations.map((observation) => plateOf(observation.vehicle))).size;
  const assessors = new Set(of.metObservations.map((observation) => observation.assessorId)).size;
  const count = (n: number, needed: number, noun: string) => (n >= needed ? [] : [`${needed} ${noun} (${n} so far)`]);
  const lacking = [
    ...count(of.metObservations.length, need.observations, "met observations"),
    ...count(vehicles, need.vehicles, "vehicles"),
    ...count(assessors, need.assessors, "assessors"),
  ];
  return lacking.length === 0 ? null : lacking.join(", ");
}

/** "AB12 CDE" and "ab12cde" are one vehicle. */
const plateOf = (vehicle: string): string => vehicle.normalize("NFKC").toUpperCase().replace(/[^\p{L}\p{N}]/gu, "");
