import { hmac } from "@noble/hashes/hmac.js";
import { sha256 } from "@noble/hashes/sha2.js";
import { bytesToHex, hexToBytes, utf8ToBytes } from "@/lib/core/ledger/bytes";

/**
 * What an entry holds in place of a personal value: HMAC-SHA-256 (RFC 2104) of its UTF-8 bytes, keyed with a random salt. Whoever has
 * value and salt can check it; once both are erased, nobody can find the value by trying.
 * @param saltHex  at least 16 random bytes as hex
 * @returns        64 hex digits
 */
export function saltedHash(saltHex: string, value: string): string {
  if (saltHex.length < 32) throw new RangeError("A salt has at least 16 bytes.");
  return bytesToHex(hmac(sha256, hexToBytes(saltHex), utf8ToBytes(value)));
}
