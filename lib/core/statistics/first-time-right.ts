import { wilsonInterval } from "@/lib/core/statistics/wilson";

/** How far a share may be trusted: not shown, shown with a word of caution, shown. */
export type Trust = "counts_only" | "with_caution" | "enough";

export type FirstTimeRight = {
  right: number;
  answers: number;
  trust: Trust;
  /** 0–1 with its 95 % interval; null while there are too few answers to say anything but the counts. */
  share: { value: number; low: number; high: number } | null;
};

/** Below the first number only counts are shown, below the second "with caution" (sheets on item analysis citing Ebel & Frisbie 1991, read second-hand). */
const COUNTS_ONLY_BELOW = 30;
const CAUTION_BELOW = 100;

/**
 * How a question was answered at people's first try, which is what they knew before being led back.
 * @param right    first answers that were right, 0 ≤ right ≤ answers
 * @param answers  first answers given, one a person
 */
export function firstTimeRight(right: number, answers: number): FirstTimeRight {
  const interval = wilsonInterval(right, answers);
  if (answers < COUNTS_ONLY_BELOW || interval === null) return { right, answers, trust: "counts_only", share: null };
  return { right, answers, trust: answers < CAUTION_BELOW ? "with_caution" : "enough", share: { value: right / answers, ...interval } };
}
