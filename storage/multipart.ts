import {
  AbortMultipartUploadCommand, CompleteMultipartUploadCommand, CreateMultipartUploadCommand, ListPartsCommand, UploadPartCommand,
  type S3Client,
} from "@aws-sdk/client-s3";
import { createReadStream } from "node:fs";
import { AppError } from "@/lib/core/errors";
import { PART_LIMITS, type ObjectFacts, type UploadedPart } from "@/storage/objects";
import { callStore, errorCode, isMissing } from "@/storage/s3-errors";

/** The client and the bucket that all calls go to. */
export type S3Place = { client: S3Client; bucket: string };

const PARTS_AT_A_TIME = 4;
const COMFORTABLE_PART_BYTES = 16 * 1024 * 1024;

/** @see ObjectStore.startMultipart */
export async function startMultipart({ client, bucket }: S3Place, key: string, contentType: string): Promise<{ uploadId: string }> {
  const command = new CreateMultipartUploadCommand({ Bucket: bucket, Key: key, ContentType: contentType });
  const { UploadId } = await callStore(() => client.send(command));
  if (!UploadId) throw new Error("The store began an upload without naming it.");
  return { uploadId: UploadId };
}

/** @see ObjectStore.listParts */
export async function listParts({ client, bucket }: S3Place, key: string, uploadId: string): Promise<UploadedPart[]> {
  const parts: UploadedPart[] = [];
  let marker: string | undefined;
  do {
    const command = new ListPartsCommand({ Bucket: bucket, Key: key, UploadId: uploadId, PartNumberMarker: marker });
    const page = await callStore(() => client.send(command)).catch((error: unknown) => {
      if (isMissing(error)) throw new AppError("gone", "This upload is no longer open. Start it again.");
      throw error;
    });
    for (const { PartNumber, Size, ETag } of page.Parts ?? []) {
      if (PartNumber === undefined || Size === undefined || ETag === undefined) throw new Error("The store listed a part without its facts.");
      parts.push({ partNumber: PartNumber, sizeBytes: Size, etag: ETag.replaceAll('"', "") });
    }
    marker = page.IsTruncated ? page.NextPartNumberMarker : undefined;
  } while (marker !== undefined);
  return parts;
}

/** Holds the parts against what the whole must be. Undersized parts are left to the store, which refuses them itself. */
function refuseIncomplete(parts: readonly UploadedPart[], expectedSizeBytes: number): void {
  const gap = parts.findIndex((part, index) => part.partNumber !== index + 1);
  if (gap >= 0) throw new AppError("conflict", `Part ${gap + 1} of the file has not arrived yet.`);
  const total = parts.reduce((sum, part) => sum + part.sizeBytes, 0);
  if (parts.length === 0 || total !== expectedSizeBytes) {
    throw new AppError("conflict", `${total} of ${expectedSizeBytes} bytes of the file have arrived.`);
  }
}

/** @see ObjectStore.completeMultipart */
export async function completeMultipart(
  place: S3Place,
  key: string,
  uploadId: string,
  expectedSizeBytes: number,
  head: () => Promise<ObjectFacts | undefined>,
): Promise<ObjectFacts> {
  try {
    const parts = await listParts(place, key, uploadId);
    refuseIncomplete(parts, expectedSizeBytes);
    const MultipartUpload = { Parts: parts.map((part) => ({ PartNumber: part.partNumber, ETag: part.etag })) };
    const command = new CompleteMultipartUploadCommand({ Bucket: place.bucket, Key: key, UploadId: uploadId, MultipartUpload });
    await callStore(() => place.client.send(command));
  } catch (error) {
    if (["EntityTooSmall", "InvalidPart", "InvalidPartOrder"].includes(errorCode(error))) {
      throw new AppError("conflict", "The parts of the file don't fit together. Upload it again.");
    }
    // An earlier call, or the other tab, may have completed it and its answer got lost.
    const gone = (error instanceof AppError && error.code === "gone") || errorCode(error) === "NoSuchUpload";
    const existing = gone ? await head() : undefined;
    if (existing?.sizeBytes === expectedSizeBytes) return existing;
    if (gone) throw new AppError("gone", "This upload is no longer open. Start it again.");
    throw error;
  }
  const facts = await head();
  if (!facts) throw new Error("The store completed an upload and has no such object.");
  return facts;
}

/** @see ObjectStore.abortMultipart */
export async function abortMultipart({ client, bucket }: S3Place, key: string, uploadId: string): Promise<void> {
  const command = new AbortMultipartUploadCommand({ Bucket: bucket, Key: key, UploadId: uploadId });
  await callStore(() => client.send(command)).catch((error: unknown) => {
    if (!isMissing(error)) throw error;
  });
}

/** Uploads a file in parts, some at a time; aborts if one fails. Part size grows with the file, to stay within the limit of parts. */
export async function uploadFileInParts(place: S3Place, key: string, path: string, sizeBytes: number, contentType: string): Promise<void> {
  const { uploadId } = await startMultipart(place, key, contentType);
  const partBytes = Math.max(COMFORTABLE_PART_BYTES, Math.ceil(sizeBytes / PART_LIMITS.maxParts));
  const count = Math.ceil(sizeBytes / partBytes);
  const etags: string[] = [];
  let next = 0;

  async function worker(): Promise<void> {
    while (next < count) {
      const index = next;
      next += 1;
      const start = index * partBytes;
      const end = Math.min(start + partBytes, sizeBytes) - 1;
      const command = new UploadPartCommand({
        Bucket: place.bucket, Key: key, UploadId: uploadId, PartNumber: index + 1,
        Body: createReadStream(path, { start, end, highWaterMark: 1024 * 1024 }), ContentLength: end - start + 1,
      });
      etags[index] = (await callStore(() => place.client.send(command))).ETag ?? "";
    }
  }

  try {
    await Promise.all(Array.from({ length: Math.min(PARTS_AT_A_TIME, count) }, worker));
    const Parts = etags.map((ETag, index) => ({ ETag, PartNumber: index + 1 }));
    const command = new CompleteMultipartUploadCommand({ Bucket: place.bucket, Key: key, UploadId: uploadId, MultipartUpload: { Parts } });
    await callStore(() => place.client.send(command));
  } catch (error) {
    next = count;
    await abortMultipart(place, key, uploadId).catch(() => {}); // The first error is the one to tell.
    throw error;
  }
}
