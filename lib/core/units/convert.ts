import { AppError } from "@/lib/core/errors";
import { findUnit } from "@/lib/core/units/units";

/**
 * Converts between two units of one quantity.
 * @throws AppError("invalid_input") for an unknown unit or another quantity
 */
export function convert(value: number, from: string, to: string): number {
  const [source, target] = [findUnit(from), findUnit(to)];
  if (!source || !target) throw new AppError("invalid_input", `“${source ? to : from}” is not a unit that Witnessline knows.`);
  if (source.quantity !== target.quantity) {
    throw new AppError("invalid_input", `${source.symbol} can't be turned into ${target.symbol}: they measure different things.`);
  }
  if (source.symbol === target.symbol) return value;
  return (value * source.factor + source.offset - target.offset) / target.factor;
}

/** Whether two units are known and measure the same thing, so that one can be turned into the other. */
export function sameQuantity(a: string, b: string): boolean {
  const quantity = findUnit(a)?.quantity;
  return quantity !== undefined && quantity === findUnit(b)?.quantity;
}
