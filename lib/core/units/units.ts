/** A unit: its symbol as shown, what it measures, and base = value × factor + offset. `aliases` are how people type it, compared without case, space and dots. */
export type Unit = { symbol: string; quantity: string; factor: number; offset: number; aliases: string[] };

// Exact by definition: the international foot 0.3048 m, the avoirdupois pound 0.45359237 kg, standard gravity 9.80665 m/s².
const POUND_FORCE = 0.45359237 * 9.80665;
const FOOT = 0.3048;
const INCH = 0.0254;

const unit = (symbol: string, quantity: string, factor: number, aliases: string[] = [], offset = 0): Unit => ({
  symbol,
  quantity,
  factor,
  offset,
  aliases,
});

export const UNITS: readonly Unit[] = [
  unit("N·m", "torque", 1, ["nm", "n-m", "newtonmetre", "newtonmetres"]),
  unit("lbf·ft", "torque", POUND_FORCE * FOOT, ["lbfft", "lbft", "ftlb", "ftlbf", "lb-ft", "ft-lb", "ft-lbf", "lbf-ft"]),
  unit("lbf·in", "torque", POUND_FORCE * INCH, ["lbfin", "lbin", "inlb", "inlbf", "lb-in", "in-lb", "lbf-in", "in-lbf"]),
  unit("kgf·m", "torque", 9.80665, ["kgfm", "kgm", "mkg", "kgf-m"]),
  unit("mm", "length", 1, ["millimetre", "millimetres"]),
  unit("in", "length", 25.4, ["inch", "inches", '"']),
  unit("bar", "pressure", 100_000),
  unit("kPa", "pressure", 1000),
  unit("Pa", "pressure", 1),
  unit("MPa", "pressure", 1_000_000),
  unit("psi", "pressure", POUND_FORCE / INCH ** 2, ["lbf/in2", "lb/in2"]),
  unit("V", "voltage", 1, ["volt", "volts"]),
  unit("mV", "voltage", 0.001),
  unit("A", "current", 1, ["amp", "amps", "ampere"]),
  unit("mA", "current", 0.001, ["milliamp", "milliamps"]),
  unit("°C", "temperature", 1, ["c", "degc", "celsius"]),
  unit("°F", "temperature", 5 / 9, ["f", "degf", "fahrenheit"], (-32 * 5) / 9),
  unit("°", "angle", 1, ["deg", "degree", "degrees"]),
  unit("Hz", "frequency", 1),
  unit("%", "share", 1, ["percent", "pct"]),
  unit("L", "volume", 1, ["litre", "litres", "liter"]),
  unit("ml", "volume", 0.001, ["millilitre", "millilitres"]),
  unit("kN", "force", 1000),
  unit("N", "force", 1, ["newton", "newtons"]),
  unit("days", "days", 1, ["day", "d"]),
  unit("min", "time", 60, ["minute", "minutes"]),
  unit("s", "time", 1, ["sec", "second", "seconds"]),
];

const plain = (text: string): string => text.trim().replace(/[\s·.⋅*×]/g, "");

const BY_SYMBOL = new Map(UNITS.map((entry) => [plain(entry.symbol), entry]));
const BY_ALIAS = new Map(UNITS.flatMap((entry) => [plain(entry.symbol).toLowerCase(), ...entry.aliases].map((name) => [name, entry])));

/** The unit that `text` names, as people write it; symbols that differ only in case (mA, MA) are told apart first. */
export function findUnit(text: string): Unit | undefined {
  return BY_SYMBOL.get(plain(text)) ?? BY_ALIAS.get(plain(text).toLowerCase());
}
