/** The rule that counts off-the-job hours. A programme's data with a date, since it changes from year to year: nothing of it stands in code. */
export type HoursRule = {
  /** Whole length of the programme, weeks. */
  weeks: number;
  /** Weeks of it that are leave by law. */
  leaveWeeks: number;
  /** Contracted hours a week. */
  hoursPerWeek: number;
  /** Hours a week above which nothing more is asked. */
  cappedAtHours: number;
  /** Share of the hours that is off the job, 0–1. */
  share: number;
};

const weeklyHours = (rule: HoursRule): number => Math.min(rule.hoursPerWeek, rule.cappedAtHours) * rule.share;

/**
 * Off-the-job hours of a whole programme: working weeks × hours a week × share.
 * @source English off-the-job guidance of 2023/24 as quoted on public pages; superseded for starts from August 2025, so an example of a rule
 */
export function programmeHours(rule: HoursRule): number {
  return (rule.weeks - rule.leaveWeeks) * weeklyHours(rule);
}

/**
 * Hours that should be logged after `elapsedWeeks`, with leave spread evenly over the programme. Never below 0 or above the whole.
 * @param elapsedWeeks  weeks since the start less breaks in learning; parts of a week count
 */
export function expectedHours(rule: HoursRule, elapsedWeeks: number): number {
  const share = Math.min(1, Math.max(0, elapsedWeeks / rule.weeks));
  return programmeHours(rule) * share;
}
