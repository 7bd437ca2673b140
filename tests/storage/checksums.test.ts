import fc from "fast-check";
import { createHash } from "node:crypto";
import { describe, expect, test } from "vitest";
import { checksumTypeFor, joinChecksums, multipartEtag, startChecksum, type ChecksumAlgorithm } from "@/storage/fake/checksums";
import { CRC, combineCrcs, startCrc, type CrcName } from "@/storage/fake/crc";
import { Refusal } from "@/storage/fake/refusal";
import checksums from "./vectors/checksums.json";
import etags from "./vectors/multipart-etag.json";

const crcNames = Object.keys(CRC) as CrcName[];

function checksumOf(algorithm: ChecksumAlgorithm, ...pieces: Buffer[]): Buffer {
  const running = startChecksum(algorithm);
  for (const piece of pieces) running.update(piece);
  return running.digest();
}

// Source: CRC catalogue check values and RFC 3720 B.4 (vectors/checksums.json).
describe.each(checksums.cases)("$name", ({ hexInput, base64, sha1, sha256, ...hex }) => {
  const input = Buffer.from(hexInput, "hex");

  test("has the published checksums", () => {
    expect(checksumOf("CRC32", input).toString("hex")).toBe(hex.crc32);
    expect(checksumOf("CRC32C", input).toString("hex")).toBe(hex.crc32c);
    expect(checksumOf("CRC64NVME", input).toString("hex")).toBe(hex.crc64nvme);
    expect(checksumOf("SHA1", input).toString("hex")).toBe(sha1);
    expect(checksumOf("SHA256", input).toString("hex")).toBe(sha256);
    expect(checksumOf("CRC64NVME", input).toString("base64")).toBe(base64.crc64nvme);
  });
});

test.each(crcNames)("%s is the same however the bytes are cut, and pieces' values join to the whole's", (name) => {
  fc.assert(
    fc.property(fc.uint8Array({ maxLength: 300 }), fc.uint8Array({ maxLength: 300 }), fc.uint8Array({ maxLength: 20 }), (...arrays) => {
      const pieces = arrays.map((array) => Buffer.from(array));
      const running = startCrc(name);
      for (const piece of pieces) running.update(piece);
      const whole = checksumOf(name, Buffer.concat(pieces));
      expect(running.digest()).toEqual(whole);
      const joined = combineCrcs(name, pieces.map((piece) => ({ digest: checksumOf(name, piece), sizeBytes: piece.length })));
      expect(joined).toEqual(whole);
    }),
    { numRuns: 60 },
  );
});

test("a composite checksum is that of the parts' checksums, with their number", () => {
  const parts = ["one", "two"].map((text) => createHash("sha256").update(text).digest());
  const expected = createHash("sha256").update(Buffer.concat(parts)).digest("base64");
  const joined = joinChecksums("SHA256", "COMPOSITE", parts.map((part) => ({ checksum: part.toString("base64"), sizeBytes: 3 })));
  expect(joined).toEqual({ algorithm: "SHA256", type: "COMPOSITE", value: `${expected}-2` });
});

// Source: Amazon S3 user guide, "Checking object integrity", table of algorithms and checksum types.
test("CRC64NVME covers only whole objects, SHA-256 only parts", () => {
  expect(checksumTypeFor("CRC64NVME", undefined)).toBe("FULL_OBJECT");
  expect(checksumTypeFor("CRC32", "FULL_OBJECT")).toBe("FULL_OBJECT");
  expect(checksumTypeFor("CRC32", undefined)).toBe("COMPOSITE");
  expect(() => checksumTypeFor("CRC64NVME", "COMPOSITE")).toThrow(Refusal);
  expect(() => checksumTypeFor("SHA256", "FULL_OBJECT")).toThrow(Refusal);
});

// Source: vectors/multipart-etag.json.
test.each(etags.cases)("ETag of $name", ({ parts, etag }) => {
  expect(`"${multipartEtag(parts.map((part) => part.md5))}"`).toBe(etag);
});
