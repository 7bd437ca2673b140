import { createHash } from "node:crypto";
import { CRC, combineCrcs, startCrc, type CrcName, type RunningChecksum } from "@/storage/fake/crc";
import { Refusal } from "@/storage/fake/refusal";

/** The additional checksums of S3, in the order in which headers are looked through. */
export const CHECKSUM_ALGORITHMS = ["CRC64NVME", "CRC32", "CRC32C", "SHA256", "SHA1"] as const;
export type ChecksumAlgorithm = (typeof CHECKSUM_ALGORITHMS)[number];

/** FULL_OBJECT covers all bytes; COMPOSITE is the checksum of the parts' checksums, written with their number. */
export type ChecksumType = "FULL_OBJECT" | "COMPOSITE";

/** `value` is base64 of the big-endian bytes; a composite one ends in "-" and the number of parts. */
export type Checksum = { algorithm: ChecksumAlgorithm; value: string; type: ChecksumType };

export const checksumHeaderName = (algorithm: ChecksumAlgorithm): string => `x-amz-checksum-${algorithm.toLowerCase()}`;
export const checksumElementName = (algorithm: ChecksumAlgorithm): string => `Checksum${algorithm}`;

const isCrc = (algorithm: ChecksumAlgorithm): algorithm is CrcName => algorithm in CRC;

/** Starts a checksum that is fed piece by piece. */
export function startChecksum(algorithm: ChecksumAlgorithm): RunningChecksum {
  if (isCrc(algorithm)) return startCrc(algorithm);
  const hash = createHash(algorithm.toLowerCase());
  return { update: (data) => void hash.update(data), digest: () => hash.digest() };
}

/** Reads an algorithm's name as clients write it. @throws Refusal InvalidRequest */
export function readAlgorithm(text: string): ChecksumAlgorithm {
  const found = CHECKSUM_ALGORITHMS.find((each) => each === text.toUpperCase());
  if (!found) throw new Refusal("InvalidRequest", "Checksum algorithm provided is unsupported.");
  return found;
}

/** What a multipart object's checksum is made of when its client didn't say. CRC64NVME knows only the whole object. */
export function checksumTypeFor(algorithm: ChecksumAlgorithm, asked: string | undefined): ChecksumType {
  const type = asked ?? (algorithm === "CRC64NVME" ? "FULL_OBJECT" : "COMPOSITE");
  const possible = type === "FULL_OBJECT" ? isCrc(algorithm) : type === "COMPOSITE" && algorithm !== "CRC64NVME";
  if (!possible) throw new Refusal("InvalidRequest", `The ${type} checksum type can't be used with ${algorithm}.`);
  return type as ChecksumType;
}

/** The checksum of an object from those of its parts. @source Amazon S3 user guide, "Checking object integrity". */
export function joinChecksums(
  algorithm: ChecksumAlgorithm,
  type: ChecksumType,
  parts: readonly { checksum: string; sizeBytes: number }[],
): Checksum {
  const pieces = parts.map((part) => ({ digest: Buffer.from(part.checksum, "base64"), sizeBytes: part.sizeBytes }));
  if (type === "FULL_OBJECT" && isCrc(algorithm)) {
    return { algorithm, type, value: combineCrcs(algorithm, pieces).toString("base64") };
  }
  const joined = startChecksum(algorithm);
  for (const piece of pieces) joined.update(piece.digest);
  return { algorithm, type: "COMPOSITE", value: `${joined.digest().toString("base64")}-${parts.length}` };
}

/** The ETag of a multipart object: MD5 of the parts' binary MD5s, "-" and their number. Without quotes. */
export function multipartEtag(partEtags: readonly string[]): string {
  const hash = createHash("md5");
  for (const etag of partEtags) hash.update(Buffer.from(etag, "hex"));
  return `${hash.digest("hex")}-${partEtags.length}`;
}
