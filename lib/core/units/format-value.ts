/** U+202F: a unit never leaves its number at a line's end. */
const NARROW_SPACE = "\u202f";

/** Decimals that a resolution asks for: 0.01 → 2, 0.5 → 1, 1 → 0. */
function decimalsOf(resolution: number): number {
  return resolution >= 1 ? 0 : Math.min(6, Math.ceil(-Math.log10(resolution) - 1e-9));
}

/** A value with its unit as it is shown, for example "25 N·m". @param resolution smallest step worth showing, in the same unit */
export function formatValue(value: number, unit: string, resolution = 0.01): string {
  const rounded = value.toFixed(decimalsOf(resolution));
  const text = resolution < 1 && !Number.isInteger(value) ? rounded : String(Number(rounded));
  return unit === "°" || unit === "%" ? `${text}${unit === "%" ? NARROW_SPACE : ""}${unit}` : `${text}${NARROW_SPACE}${unit}`;
}
