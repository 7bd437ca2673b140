import { convert } from "@/lib/core/units/convert";
import { findUnit } from "@/lib/core/units/units";
import { formatValue } from "@/lib/core/units/format-value";

export type ParsedTightening = { newtonMetres: number; angleDegrees: number | null };

const NUMBER = String.raw`\d+(?:[.,]\d+)?`;
const SHAPE = new RegExp(String.raw`^\s*(${NUMBER})\s*([^\d+]+?)\s*((?:\+\s*${NUMBER}\s*(?:°|deg|degrees?)?\s*)*)$`, "i");

const toNumber = (text: string): number => Number(text.replace(",", "."));

/**
 * Understands a tightening value as a mentor types it: "25 Nm", "18 lbf ft", "25 N·m + 90°", "50 Nm + 60° + 60°" (angles add up).
 * @returns the torque in N·m (exact factors) and the total angle, or a sentence that says what is not understood
 */
export function parseTightening(text: string): ParsedTightening | { problem: string } {
  const match = SHAPE.exec(text);
  if (!match) return { problem: `“${text}” is not understood. Write it like 25 Nm, 18 lbf ft or 50 Nm + 90°.` };
  const [, torque = "", unitText = "", angles = ""] = match;
  const unit = findUnit(unitText);
  if (!unit || unit.quantity !== "torque") return { problem: `“${unitText.trim()}” is not a unit of torque. Use Nm, lbf ft, lbf in or kgf m.` };
  const newtonMetres = convert(toNumber(torque), unit.symbol, "N·m");
  if (newtonMetres <= 0) return { problem: "A tightening value is above zero." };
  const degrees = [...angles.matchAll(new RegExp(NUMBER, "g"))].map(([angle]) => toNumber(angle));
  return { newtonMetres, angleDegrees: degrees.length === 0 ? null : degrees.reduce((sum, angle) => sum + angle, 0) };
}

/** A tightening value as it is shown: "50 N·m + 90°". Torque to three significant figures where it was converted. */
export function formatTightening(value: ParsedTightening): string {
  const torque = Number(value.newtonMetres.toPrecision(3));
  const resolution = torque >= 100 || Number.isInteger(torque) ? 1 : 0.1;
  return `${formatValue(torque, "N·m", resolution)}${value.angleDegrees === null ? "" : ` + ${value.angleDegrees}°`}`;
}
