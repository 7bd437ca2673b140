/** The shape of a fault code: P0301, U3FFF. */
export const FAULT_CODE = /^[PCBU][0-3][0-9A-F]{3}$/;

/**
 * A fault code from the two bytes in which a control unit sends it: two bits of letter, two of first digit, then three hex digits.
 * @returns null for 0000, which pads a message and is no code
 * @source SAE J2012 / ISO 15031-6, as decoded by the public cases named in the tests
 */
export function faultCodeOf(high: number, low: number): string | null {
  const bits = ((high & 0xff) << 8) | (low & 0xff);
  if (bits === 0) return null;
  const letter = "PCBU".charAt(bits >> 14);
  return `${letter}${(bits >> 12) & 3}${(bits & 0xfff).toString(16).toUpperCase().padStart(3, "0")}`;
}

/** All fault codes of a message's payload, in its order; padding and an odd last byte are dropped. @param bytes values 0–255 */
export function faultCodesOf(bytes: ArrayLike<number>): string[] {
  const codes: string[] = [];
  for (let at = 0; at + 1 < bytes.length; at += 2) {
    const code = faultCodeOf(bytes[at] ?? 0, bytes[at + 1] ?? 0);
    if (code !== null) codes.push(code);
  }
  return codes;
}
