/** A unit: its symbol as shown, what it measures, and base = value × factor + offset. `aliases` are how people type it. */
export type Unit = { readonly symbol: string; readonly quantity: string; readonly factor: number; readonly offset: number; readonly aliases: readonly string[] };

// Exact by definition: the international foot 0.3048 m, the avoirdupois pound 0.45359237 kg, standard gravity 9.80665 m/s².
const POUND_FORCE = 0.45359237 * 9.80665;
const FOOT = 0.3048;
const INCH = 0.0254;

const unit = (symbol: string, quantity: string, factor: number, aliases: readonly string[] = [], offset = 0): Unit => ({
  symbol,
  quantity,
  factor,
  offset,
  aliases,
});

/** Every unit that a reading, a tightening value or a question may have. @source SI Brochure; NIST SP 811, appendix B */
export const UNITS: readonly Unit[] = [
  unit("N·m", "torque", 1, ["newton metre", "newton metres", "newton meter", "newton meters"]),
  unit("lbf·ft", "torque", POUND_FORCE * FOOT, ["lb ft", "lbs ft", "lbsf ft", "ft lb", "ft lbs", "ft lbf", "foot pound", "foot pounds", "pound foot", "pound feet"]),
  unit("lbf·in", "torque", POUND_FORCE * INCH, ["lb in", "lbs in", "in lb", "in lbs", "in lbf", "inch pound", "inch pounds", "pound inch", "pound inches"]),
  unit("kgf·m", "torque", 9.80665, ["kg m", "kgm", "m kg", "mkp", "kp m"]),
  unit("mm", "length", 1, ["millimetre", "millimetres"]),
  unit("in", "length", 25.4, ["inch", "inches", '"']),
  unit("bar", "pressure", 100_000),
  unit("kPa", "pressure", 1000),
  unit("Pa", "pressure", 1),
  unit("MPa", "pressure", 1_000_000),
  unit("psi", "pressure", POUND_FORCE / INCH ** 2, ["lbf/in2", "lb/in2", "psig"]),
  unit("V", "voltage", 1, ["volt", "volts"]),
  unit("mV", "voltage", 0.001),
  unit("A", "current", 1, ["amp", "amps", "ampere"]),
  unit("mA", "current", 0.001, ["milliamp", "milliamps"]),
  unit("°C", "temperature", 1, ["c", "deg c", "celsius"]),
  unit("°F", "temperature", 5 / 9, ["f", "deg f", "fahrenheit"], (-32 * 5) / 9),
  unit("°", "angle", 1, ["deg", "degree", "degrees"]),
  unit("Hz", "frequency", 1, ["hertz"]),
  unit("%", "share", 1, ["percent", "pct"]),
  unit("L", "volume", 1, ["litre", "litres", "liter", "liters"]),
  unit("ml", "volume", 0.001, ["millilitre", "millilitres", "cc"]),
  unit("kN", "force", 1000),
  unit("N", "force", 1, ["newton", "newtons"]),
  unit("days", "days", 1, ["day", "d"]),
  unit("min", "time", 60, ["minute", "minutes"]),
  unit("s", "time", 1, ["sec", "second", "seconds"]),
];

/** Space, dots, hyphens and signs of multiplication don't tell units apart, nor do the ways to write a degree or a square. */
const plain = (text: string): string =>
  text
    .replace(/[\s·.⋅∙•*×‐‑–-]/g, "")
    .replace(/[º˚]/g, "°")
    .replaceAll("²", "2");

const BY_SYMBOL = new Map(UNITS.map((entry) => [plain(entry.symbol), entry]));
const BY_NAME = new Map(UNITS.flatMap((entry) => [entry.symbol, ...entry.aliases].map((name) => [plain(name).toLowerCase(), entry])));

/** The unit that `text` names, as people write it ("Nm", "lb ft", "ft-lb"); symbols that differ only in case (mm, MM) are told apart first. */
export function findUnit(text: string): Unit | undefined {
  return BY_SYMBOL.get(plain(text)) ?? BY_NAME.get(plain(text).toLowerCase());
}
