import { createHash } from "node:crypto";

/**
 * The id of a thing in the demo: always the same for the same name, so that loading the demo twice gives the same addresses.
 * @param name  a path of our own, for example "front-brake-discs/step/A3".
 * @returns     a UUID of version 8, whose bits are the maker's own choice: here the first 122 bits of the name's SHA-256.
 * @source      RFC 9562, section 5.8 and appendix B.2 (https://www.rfc-editor.org/rfc/rfc9562)
 */
export function demoId(name: string): string {
  const bytes = createHash("sha256").update(`witnessline demo/${name}`).digest().subarray(0, 16);
  bytes[6] = ((bytes[6] ?? 0) & 0x0f) | 0x80;
  bytes[8] = ((bytes[8] ?? 0) & 0x3f) | 0x80;
  return bytes.toString("hex").replace(/^(.{8})(.{4})(.{4})(.{4})(.{12})$/, "$1-$2-$3-$4-$5");
}
