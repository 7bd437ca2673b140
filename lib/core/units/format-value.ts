/** U+202F: a unit never leaves its number at a line's end. */
const NARROW_SPACE = "\u202f";

/** Decimals that a resolution asks for: 0.01 → 2, 0.5 → 1, 1 → 0. */
function decimalsOf(resolution: number): number {
  return resolution >= 1 ? 0 : Math.min(6, Math.ceil(-Math.log10(resolution) - 1e-9));
}

/** Rounds half away from zero as people do on paper; a binary fraction that falls short of the half (1.005) counts as the half. */
function rounded(value: number, decimals: number): string {
  const scaled = Math.round(Number((Math.abs(value) * 10 ** decimals).toPrecision(14)));
  return `${value < 0 && scaled !== 0 ? "-" : ""}${(scaled / 10 ** decimals).toFixed(decimals)}`;
}

/**
 * A value with its unit as it is shown, for example "25 N·m". For display only: what is stored is never rounded.
 * @param resolution  smallest step worth showing, in the same unit; a whole number is shown without decimals
 */
export function formatValue(value: number, unit: string, resolution = 0.01): string {
  const text = rounded(value, Number.isInteger(value) ? 0 : decimalsOf(resolution));
  return unit === "°" ? `${text}${unit}` : `${text}${NARROW_SPACE}${unit}`;
}
