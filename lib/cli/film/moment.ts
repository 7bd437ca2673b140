/** How long ago each line of the scene began, in milliseconds; negative when it is still to come. */
export type Since = (line: number) => number;

/** A drawing, 780 by 520, at one moment of its scene. */
export type Picture = (since: Since) => string;

/** How far a movement is, 0 to 1, gently begun and ended. @param ms time since its line began */
export function glide(ms: number, fromMs: number, lengthMs: number): number {
  const part = Math.min(1, Math.max(0, (ms - fromMs) / lengthMs));
  return part * part * (3 - 2 * part);
}

/** Which of `count` equal stages is reached: 0 before `fromMs`, then 1, 2, … `count`. */
export const stage = (ms: number, fromMs: number, eachMs: number, count: number): number =>
  Math.min(count, Math.max(0, Math.floor((ms - fromMs) / eachMs) + 1));

/** Between two values. */
export const between = (from: number, to: number, part: number): number => from + (to - from) * part;
