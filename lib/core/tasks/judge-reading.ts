import { AppError } from "@/lib/core/errors";
import type { ReadingSpec, TakenReading } from "@/lib/core/tasks/types";
import { convert } from "@/lib/core/units/convert";
import { formatValue } from "@/lib/core/units/format-value";

/** What the program says of a reading. `canBeMet` false: the criterion can't be met with it, whatever the assessor thinks. */
export type JudgedReading = { verdict: "inside" | "near" | "outside"; sentence: string; canBeMet: boolean };

/** A found value within this many resolutions of its limit is "near": worth a second measurement. Common practice, no source. */
const NEAR_RESOLUTIONS = 2;

/**
 * Compares a reading with its limits (simple acceptance: the limits as they are, JCGM 106:2012). A *set* reading is decided by them. Of
 * a *found* one the program says what the value means; the assessor judges measuring and conclusion. Either way an instrument that is
 * out of date can't make a reading met.
 * @throws AppError("invalid_input") when the unit is of another quantity, or the value is no number
 */
export function judgeReading(spec: ReadingSpec, reading: TakenReading): JudgedReading {
  if (!Number.isFinite(reading.value)) throw new AppError("invalid_input", "A reading is a number with its unit.");
  const value = convert(reading.value, reading.unit, spec.unit);
  const { distance, side } = distanceInside(spec, value);
  const verdict = distance < 0 ? "outside" : spec.mode === "found" && distance <= NEAR_RESOLUTIONS * spec.resolution ? "near" : "inside";
  if (reading.instrumentInDate === false) {
    return { verdict, sentence: "The instrument is past its calibration date: this reading can't make the criterion met.", canBeMet: false };
  }
  if (distance < 0) {
    const by = `${formatValue(-distance, spec.unit, spec.resolution)} ${side}`;
    return spec.mode === "set"
      ? { verdict, sentence: `${by}: outside the limits, so this is not met.`, canBeMet: false }
      : { verdict, sentence: `${by}: outside the limit. Measured right, and said so?`, canBeMet: true };
  }
  const meaning = verdict === "near" ? "close to the limit. Measured right, and said so?" : "inside the limits.";
  return { verdict, sentence: `${formatValue(value, spec.unit, spec.resolution)}: ${meaning}`, canBeMet: true };
}

/** How far inside the nearest limit a value lies; negative outside. Rounded to hide what binary fractions add: 28.1 − 28 isn't 0.1000…01. */
function distanceInside(spec: ReadingSpec, value: number): { distance: number; side: "under" | "over" } {
  const tidy = (x: number) => Math.round(x * 1e9) / 1e9;
  const fromLower = spec.lower === null ? Number.POSITIVE_INFINITY : tidy(value - spec.lower);
  const fromUpper = spec.upper === null ? Number.POSITIVE_INFINITY : tidy(spec.upper - value);
  return fromLower <= fromUpper ? { distance: fromLower, side: "under" } : { distance: fromUpper, side: "over" };
}
