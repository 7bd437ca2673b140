import type { Readable } from "node:stream";

/** What is known of an object without reading it. `etag` is without quotes; it is no hash of the bytes (see multipart). */
export type ObjectFacts = { sizeBytes: number; etag: string; contentType: string; modifiedAt: Date };

/** First and last byte, both included; without `end`, to the end of the object. */
export type ObjectRange = { start: number; end?: number };

export type ObjectStream = ObjectFacts & { body: Readable };

/** A part that has arrived. Numbers run from 1. */
export type UploadedPart = { partNumber: number; sizeBytes: number; etag: string };

/** A checksum that the browser sends along, and that the store holds the bytes to. `value` is base64 of the big-endian bytes. */
export type PartChecksum = { algorithm: "CRC32" | "CRC32C" | "CRC64NVME" | "SHA256"; value: string };

/** How a presigned GET overrides what the store would send, and how long its address stays the same. */
export type PresignGetOptions = {
  responseContentType?: string;
  responseContentDisposition?: string;
  /**
   * The address is the same for all calls within a stretch of this length, so that the browser's cache and the player
   * keep what they have. Default an hour; 0 signs with the present second.
   */
  steadySeconds?: number;
};

/** Source: Amazon S3 user guide, "Amazon S3 multipart upload limits". Every part but the last has at least the minimum. */
export const PART_LIMITS = { minBytes: 5 * 1024 * 1024, maxBytes: 5 * 1024 ** 3, maxParts: 10_000 } as const;

/**
 * Where the bytes of recordings and evidence are kept. Keys come from `storage/keys`.
 *
 * Every function throws AppError("unavailable") when the store can't be reached or refuses for want of strength, and
 * those named beside it. Anything else that the store says is a fault of ours and is thrown as it came.
 */
export type ObjectStore = {
  /** Makes the bucket if it isn't there. */
  ensureBucket(): Promise<void>;

  /** Writes a small object whole, in place of an earlier one. `ifAbsent`: @throws AppError("conflict") if the key is taken. */
  putObject(key: string, body: Buffer | string, options: { contentType: string; ifAbsent?: boolean }): Promise<{ etag: string }>;

  /** Opens an object for reading; read the body to its end or destroy it. @throws AppError("not_found") */
  getObject(key: string, range?: ObjectRange): Promise<ObjectStream>;

  /** Reads an object into a file, whole or not at all. @throws AppError("not_found") */
  downloadToFile(key: string, path: string): Promise<ObjectFacts>;

  /** Writes a file of any size as an object, whole or not at all; a large one in several parts at a time. */
  uploadFromFile(key: string, path: string, options: { contentType: string }): Promise<{ sizeBytes: number }>;

  /** undefined when there is no such object. */
  headObject(key: string): Promise<ObjectFacts | undefined>;

  /** All keys that begin so, in order. */
  listKeys(prefix: string): AsyncGenerator<string>;

  /** No error when there is no such object. */
  deleteObject(key: string): Promise<void>;

  /** Any number of keys. */
  deleteObjects(keys: readonly string[]): Promise<void>;

  /** Begins an upload that a browser fills by presigned parts. The content type stays with the object. */
  startMultipart(key: string, options: { contentType: string }): Promise<{ uploadId: string }>;

  /**
   * The address to which a browser PUTs one part, good for `expiresSeconds`.
   * @param contentLength  if given, the store refuses a body of another length.
   * @param checksum       if given, the browser must send it in the header of `checksumHeader(checksum)`, and the store
   *                       refuses bytes that don't fit.
   */
  presignPart(
    key: string,
    uploadId: string,
    partNumber: number,
    expiresSeconds: number,
    contentLength?: number,
    checksum?: PartChecksum,
  ): Promise<string>;

  /** All parts that have arrived, by number. @throws AppError("gone") if the upload was completed or aborted */
  listParts(key: string, uploadId: string): Promise<UploadedPart[]>;

  /**
   * Makes the object out of the parts that the store has; what a browser says about them doesn't count. Safe to call twice.
   * @param expectedSizeBytes the size that the whole must have.
   * @throws AppError("conflict") if parts are missing, too small, or don't add up; AppError("gone") if the upload was aborted
   */
  completeMultipart(key: string, uploadId: string, expectedSizeBytes: number): Promise<ObjectFacts>;

  /** Throws the parts away. No error when there is no such upload. */
  abortMultipart(key: string, uploadId: string): Promise<void>;

  /** An address from which a browser may read for at least `expiresSeconds`, ranges included. Hours are right for film. */
  presignGet(key: string, expiresSeconds: number, options?: PresignGetOptions): Promise<string>;
};

/** The header in which a browser sends a part's checksum. */
export const checksumHeader = ({ algorithm, value }: PartChecksum): [name: string, value: string] => [
  `x-amz-checksum-${algorithm.toLowerCase()}`,
  value,
];
