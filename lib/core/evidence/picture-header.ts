export type PictureHeader = { mediaType: "image/jpeg" | "image/png" | "image/webp"; width: number; height: number };

const u16 = (bytes: Uint8Array, at: number): number => ((bytes[at] ?? 0) << 8) | (bytes[at + 1] ?? 0);
const u32 = (bytes: Uint8Array, at: number): number => u16(bytes, at) * 65_536 + u16(bytes, at + 2);
const ascii = (bytes: Uint8Array, at: number, length: number): string => String.fromCharCode(...bytes.subarray(at, at + length));

/**
 * What a picture's first bytes say it is, whatever its name claims; null for anything that is not a JPEG, PNG or WebP. Reads the header
 * only, so a picture that would burst on decoding is known before anything decodes it.
 * @source PNG: RFC 2083, 3.1 and 4.1.1; JPEG: ITU T.81, B.2.2; WebP: RFC 9649, 2.5–2.7
 */
export function pictureHeader(bytes: Uint8Array): PictureHeader | null {
  return pngHeader(bytes) ?? jpegHeader(bytes) ?? webpHeader(bytes);
}

function pngHeader(bytes: Uint8Array): PictureHeader | null {
  const signature = [0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a];
  if (bytes.length < 24 || !signature.every((byte, at) => bytes[at] === byte) || ascii(bytes, 12, 4) !== "IHDR") return null;
  return { mediaType: "image/png", width: u32(bytes, 16), height: u32(bytes, 20) };
}

function jpegHeader(bytes: Uint8Array): PictureHeader | null {
  if (bytes[0] !== 0xff || bytes[1] !== 0xd8) return null;
  let at = 2;
  while (at + 9 < bytes.length && bytes[at] === 0xff) {
    const marker = bytes[at + 1] ?? 0;
    // Frame headers are C0–CF without the tables C4, C8 and CC.
    const isFrame = marker >= 0xc0 && marker <= 0xcf && marker !== 0xc4 && marker !== 0xc8 && marker !== 0xcc;
    if (isFrame) return { mediaType: "image/jpeg", width: u16(bytes, at + 7), height: u16(bytes, at + 5) };
    at += 2 + u16(bytes, at + 2);
  }
  return null;
}

function webpHeader(bytes: Uint8Array): PictureHeader | null {
  if (bytes.length < 30 || ascii(bytes, 0, 4) !== "RIFF" || ascii(bytes, 8, 4) !== "WEBP") return null;
  const little = (at: number, length: number) => Array.from({ length }, (_, i) => (bytes[at + i] ?? 0) * 256 ** i).reduce((a, b) => a + b, 0);
  const kind = ascii(bytes, 12, 4);
  if (kind === "VP8X") return { mediaType: "image/webp", width: little(24, 3) + 1, height: little(27, 3) + 1 };
  if (kind === "VP8L") return { mediaType: "image/webp", width: (little(21, 2) & 0x3fff) + 1, height: ((little(21, 4) >>> 14) & 0x3fff) + 1 };
  if (kind === "VP8 ") return { mediaType: "image/webp", width: little(26, 2) & 0x3fff, height: little(28, 2) & 0x3fff };
  return null;
}
