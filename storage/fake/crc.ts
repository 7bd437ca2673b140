/** A checksum that is fed piece by piece. `digest` gives the big-endian bytes. */
export type RunningChecksum = { update(data: Buffer): void; digest(): Buffer };

/** The three CRCs of S3: width in bits and reflected polynomial; all start from and end in all ones, reflected both ways. */
export const CRC = {
  CRC32: { width: 32n, polynomial: 0xedb88320n },
  CRC32C: { width: 32n, polynomial: 0x82f63b78n },
  CRC64NVME: { width: 64n, polynomial: 0x9a6c9329ac4bc9b5n },
} as const;
export type CrcName = keyof typeof CRC;

// Eight tables ("slicing by eight"): eight bytes are taken in one step, which is what keeps up with the disk.
const SLICES = 8;

/** table[slice * 256 + byte], split into low and high words because BigInt is a hundred times too slow here. */
function buildTables({ width, polynomial }: (typeof CRC)[CrcName]) {
  const low = new Int32Array(SLICES * 256);
  const high = new Int32Array(SLICES * 256);
  for (let byte = 0; byte < 256; byte += 1) {
    let value = BigInt(byte);
    for (let slice = 0; slice < SLICES; slice += 1) {
      for (let bit = 0; bit < 8; bit += 1) value = value & 1n ? (value >> 1n) ^ polynomial : value >> 1n;
      low[slice * 256 + byte] = Number(BigInt.asIntN(32, value));
      high[slice * 256 + byte] = Number(BigInt.asIntN(32, value >> 32n));
    }
  }
  return { low, high, bytes: Number(width / 8n) };
}
const tables = new Map<CrcName, ReturnType<typeof buildTables>>();

/** A CRC of all that it is fed. Held to the check values of the CRC catalogue and of RFC 3720. */
export function startCrc(name: CrcName): RunningChecksum {
  const built = tables.get(name) ?? buildTables(CRC[name]);
  tables.set(name, built);
  const { low, high, bytes } = built;
  let lo = -1;
  let hi = bytes === 8 ? -1 : 0;
  return {
    update(data) {
      let at = 0;
      const bulk = data.length - (data.length % SLICES);
      while (at < bulk) {
        // For a 32-bit CRC `hi` stays 0 and this is the textbook form for both widths.
        const a = lo ^ data.readInt32LE(at);
        const b = hi ^ data.readInt32LE(at + 4);
        const i0 = 1792 + (a & 255), i1 = 1536 + ((a >>> 8) & 255), i2 = 1280 + ((a >>> 16) & 255), i3 = 1024 + (a >>> 24);
        const i4 = 768 + (b & 255), i5 = 512 + ((b >>> 8) & 255), i6 = 256 + ((b >>> 16) & 255), i7 = b >>> 24;
        lo = low[i0]! ^ low[i1]! ^ low[i2]! ^ low[i3]! ^ low[i4]! ^ low[i5]! ^ low[i6]! ^ low[i7]!;
        if (bytes === 8) {
          hi = high[i0]! ^ high[i1]! ^ high[i2]! ^ high[i3]! ^ high[i4]! ^ high[i5]! ^ high[i6]! ^ high[i7]!;
        }
        at += SLICES;
      }
      for (; at < data.length; at += 1) {
        const index = (lo ^ data[at]!) & 255;
        lo = ((lo >>> 8) | (bytes === 8 ? hi << 24 : 0)) ^ low[index]!;
        hi = bytes === 8 ? (hi >>> 8) ^ high[index]! : 0;
      }
    },
    digest() {
      const digest = Buffer.alloc(bytes);
      digest.writeInt32BE(~lo, bytes - 4);
      if (bytes === 8) digest.writeInt32BE(~hi, 0);
      return digest;
    },
  };
}

/** The product of two polynomials modulo the CRC's, in the reflected order of bits. */
function multiply({ width, polynomial }: (typeof CRC)[CrcName], a: bigint, b: bigint): bigint {
  let product = 0n;
  for (let bit = width - 1n; bit >= 0n; bit -= 1n) {
    if ((a >> bit) & 1n) product ^= b;
    b = b & 1n ? (b >> 1n) ^ polynomial : b >> 1n;
  }
  return product;
}

/** x to the power of 8 × `sizeBytes`, modulo the CRC's polynomial. */
function shiftBy(crc: (typeof CRC)[CrcName], sizeBytes: number): bigint {
  let result = 1n << (crc.width - 1n);
  let square = 1n << (crc.width - 2n);
  for (let exponent = 8n * BigInt(sizeBytes); exponent > 0n; exponent >>= 1n) {
    if (exponent & 1n) result = multiply(crc, result, square);
    square = multiply(crc, square, square);
  }
  return result;
}

/**
 * The CRC of joined pieces, from the CRC of each, without reading a byte again: crc(A B) = crc(A) x^(8|B|) + crc(B).
 * This is how an object gets its "full object" checksum from its parts.
 */
export function combineCrcs(name: CrcName, pieces: readonly { digest: Buffer; sizeBytes: number }[]): Buffer {
  const crc = CRC[name];
  const shifts = new Map<number, bigint>();
  let joined = 0n;
  for (const { digest, sizeBytes } of pieces) {
    const shift = shifts.get(sizeBytes) ?? shiftBy(crc, sizeBytes);
    shifts.set(sizeBytes, shift);
    joined = multiply(crc, joined, shift) ^ BigInt(`0x${digest.toString("hex")}`);
  }
  return Buffer.from(joined.toString(16).padStart(Number(crc.width / 4n), "0"), "hex");
}
