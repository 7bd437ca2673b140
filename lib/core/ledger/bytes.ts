import { sha256 } from "@noble/hashes/sha2.js";
import { bytesToHex, hexToBytes, utf8ToBytes } from "@noble/hashes/utils.js";

/** SHA-256 of a text's UTF-8 bytes, as 64 hex digits. */
export function sha256Hex(text: string): string {
  return bytesToHex(sha256(utf8ToBytes(text)));
}

/** SHA-256 over the parts joined, as bytes. */
export function sha256Bytes(...parts: Uint8Array[]): Uint8Array {
  const hash = sha256.create();
  for (const part of parts) hash.update(part);
  return hash.digest();
}

export { bytesToHex, hexToBytes, utf8ToBytes };
