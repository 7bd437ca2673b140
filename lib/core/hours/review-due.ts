import { addDays, daysBetween } from "@/lib/core/dates";

/** When the next progress review falls due, and by how many days it is late (0 when it isn't). Days are yyyy-mm-dd. */
export type ReviewDue = { dueOn: string; daysLate: number };

/**
 * A progress review is due a set number of days after the last one, or after the start when there was none.
 * @param intervalDays  the programme's own, for example 84
 */
export function reviewDue(lastOn: string, intervalDays: number, today: string): ReviewDue {
  const dueOn = addDays(lastOn, intervalDays);
  return { dueOn, daysLate: Math.max(0, daysBetween(dueOn, today)) };
}
