import { FAULT_CODE } from "@/lib/core/fault-codes/decode-fault-codes";

export type FaultCodeSystem = "powertrain" | "chassis" | "body" | "network";

/**
 * What a code says by its shape. `defined`: "shared" codes mean the same on every vehicle, a "maker" code means what the vehicle's maker
 * says. `cylinder` and `meaning` only where the code counts cylinders.
 */
export type FaultCodeDescription = {
  code: string;
  system: FaultCodeSystem;
  defined: "shared" | "maker";
  cylinder: number | null;
  meaning: string | null;
};

const SYSTEMS: Readonly<Record<string, FaultCodeSystem>> = { P: "powertrain", C: "chassis", B: "body", U: "network" };

/** What a fault code says by itself, or undefined where it is none. It names a symptom; the cause is found by testing. */
export function describeFaultCode(code: string): FaultCodeDescription | undefined {
  const system = FAULT_CODE.test(code) ? SYSTEMS[code.charAt(0)] : undefined;
  if (!system) return undefined;
  return { code, system, defined: definedBy(code), ...cylinderOf(code) };
}

/**
 * Of P codes 0 and 2 are shared, 1 is the maker's, and 3 is the maker's up to P33FF; of the others 0 and 3 are shared (3 is kept back
 * for later), 1 and 2 the maker's.
 * @source ranges of SAE J2012 as a printed manual quotes them (named in the tests); the text of the standard was not at hand
 */
function definedBy(code: string): "shared" | "maker" {
  const [letter, digit] = [code.charAt(0), code.charAt(1)];
  if (digit === "0") return "shared";
  if (digit === "1") return "maker";
  if (letter === "P") return digit === "2" || Number.parseInt(code.slice(2), 16) >= 0x400 ? "shared" : "maker";
  return digit === "3" ? "shared" : "maker";
}

const INJECTOR = ["injector circuit low", "injector circuit high", "contribution or balance"] as const;

/**
 * Cylinder by formula: a widely copied list is shifted by one, so no list is kept here.
 * @source vectors/vehicle/dtc.json (48 published rows match; those of P03xx from memory)
 */
function cylinderOf(code: string): { cylinder: number | null; meaning: string | null } {
  // Hex digits never stand in these ranges.
  const number = /^P0\d{3}$/.test(code) ? Number(code.slice(1)) : 0;
  if (number >= 201 && number <= 212) return { cylinder: number - 200, meaning: "injector circuit open" };
  if (number >= 261 && number <= 296) return { cylinder: Math.floor((number - 261) / 3) + 1, meaning: INJECTOR[(number - 261) % 3] ?? null };
  if (number === 300) return { cylinder: null, meaning: "misfire on several cylinders" };
  if (number >= 301 && number <= 312) return { cylinder: number - 300, meaning: "misfire" };
  return { cylinder: null, meaning: null };
}
