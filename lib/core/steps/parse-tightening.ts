import { convert } from "@/lib/core/units/convert";
import { formatValue } from "@/lib/core/units/format-value";
import { findUnit } from "@/lib/core/units/units";

/** What a tightening value means: torque in N·m by exact factors, and the angles of all stages added up; null without any. */
export type ParsedTightening = { newtonMetres: number; angleDegrees: number | null };

const NUMBER = String.raw`\d+(?:[.,]\d+)?`;
const SHAPE = new RegExp(String.raw`^\s*(${NUMBER})\s*([^\d+]*?)\s*((?:\+\s*${NUMBER}\s*(?:°|º|˚|deg(?:rees?)?)?\s*)*)$`, "i");
/** One thousand one hundred, or a little over one? In either reading somebody would be wrong by a thousand. */
const DOUBTFUL = /(?<!\d)[1-9]\d{0,2}[.,]\d{3}(?!\d)/;
/** One full turn: a stage of more is a slip of the hand. */
const LARGEST_STAGE_DEGREES = 360;

const toNumber = (text: string): number => Number(text.replace(",", "."));

/**
 * Understands a tightening value as a mentor types it: "25 Nm", "18 lbf ft", "25 N·m + 90°", "50 Nm + 60° + 60°" (angles add up).
 * @returns torque and total angle, or a sentence that says what is not understood; nothing is guessed
 */
export function parseTightening(text: string): ParsedTightening | { problem: string } {
  const read = readStages(text);
  if ("problem" in read) return read;
  const { newtonMetres, stages } = read;
  return { newtonMetres, angleDegrees: stages.length === 0 ? null : stages.reduce((sum, degrees) => sum + degrees, 0) };
}

function readStages(text: string): { newtonMetres: number; stages: number[] } | { problem: string } {
  const doubtful = DOUBTFUL.exec(text)?.[0];
  if (doubtful) return { problem: `“${doubtful}” can be read as thousands or as a fraction. Write it without the mark, or with fewer decimals.` };
  const match = SHAPE.exec(text);
  if (!match) return { problem: `“${text.trim()}” is not understood. Write it like 25 Nm, 18 lbf ft or 50 Nm + 90°.` };
  const [, torque = "", unitText = "", angles = ""] = match;
  if (unitText === "") return { problem: "Say the unit of torque: Nm, lbf ft, lbf in or kgf m." };
  const unit = findUnit(unitText);
  if (unit?.quantity !== "torque") return { problem: `“${unitText}” is not a unit of torque. Use Nm, lbf ft, lbf in or kgf m.` };
  const newtonMetres = convert(toNumber(torque), unit.symbol, "N·m");
  if (newtonMetres <= 0) return { problem: "A tightening value is above zero." };
  const stages = [...angles.matchAll(new RegExp(NUMBER, "g"))].map(([angle]) => toNumber(angle));
  if (stages.some((degrees) => degrees <= 0 || degrees > LARGEST_STAGE_DEGREES)) return { problem: "An angle lies above zero, and is at most a full turn of 360°." };
  return { newtonMetres, stages };
}

/**
 * A tightening value as it is shown: "50 N·m + 90°". A torque that was entered in N·m is shown as it was entered; one that was converted,
 * to three significant figures. With `entered`, stages of angle are shown one by one.
 */
export function formatTightening(value: ParsedTightening & { entered?: string }): string {
  const torque = isTyped(value.newtonMetres) ? value.newtonMetres : Number(value.newtonMetres.toPrecision(3));
  const stages = value.angleDegrees === null ? [] : (stagesOf(value) ?? [value.angleDegrees]);
  return [formatValue(torque, "N·m", resolutionOf(torque)), ...stages.map((degrees) => `${degrees}°`)].join(" + ");
}

/** Nobody types more than three decimals; a conversion nearly always leaves more. */
const isTyped = (newtonMetres: number): boolean => Math.abs(newtonMetres * 1000 - Math.round(newtonMetres * 1000)) < 1e-6;

/** The smallest decimal place that the value uses, so that it is shown whole. */
const resolutionOf = (value: number): number => [1, 0.1, 0.01].find((step) => Math.abs(value / step - Math.round(value / step)) < 1e-6) ?? 0.001;

/** The stages as they were entered, where they still say what the numbers say. */
function stagesOf({ entered, angleDegrees }: ParsedTightening & { entered?: string }): number[] | undefined {
  const read = entered === undefined ? undefined : readStages(entered);
  if (!read || "problem" in read) return undefined;
  return read.stages.reduce((sum, degrees) => sum + degrees, 0) === angleDegrees ? read.stages : undefined;
}
