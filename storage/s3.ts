import {
  CreateBucketCommand, DeleteObjectCommand, DeleteObjectsCommand, GetObjectCommand, HeadBucketCommand, HeadObjectCommand, PutObjectCommand,
  S3Client, UploadPartCommand, paginateListObjectsV2,
} from "@aws-sdk/client-s3";
import { getSignedUrl } from "@aws-sdk/s3-request-presigner";
import { randomUUID } from "node:crypto";
import { createReadStream, createWriteStream } from "node:fs";
import { rename, rm, stat } from "node:fs/promises";
import { Readable } from "node:stream";
import { pipeline } from "node:stream/promises";
import { AppError } from "@/lib/core/errors";
import { abortMultipart, completeMultipart, listParts, startMultipart, uploadFileInParts } from "@/storage/multipart";
import type { ObjectFacts, ObjectRange, ObjectStore, PresignGetOptions } from "@/storage/objects";
import { checksumHeader } from "@/storage/objects";
import { callStore, errorCode, isMissing } from "@/storage/s3-errors";

export type ObjectStoreOptions = {
  /** Where the server reaches the store. */
  endpoint: string;
  /** Where browsers reach it; what is presigned is signed for this host. */
  publicEndpoint: string;
  region: string;
  bucket: string;
  accessKeyId: string;
  secretAccessKey: string;
  /** `/bucket/key` rather than the bucket in the host's name. */
  forcePathStyle: boolean;
  /** The clock that presigned addresses are dated by. Default: the machine's. */
  now?: () => Date;
};

const ONE_PUT_BYTES = 64 * 1024 * 1024;
const DELETED_AT_ONCE = 1000;
const MAX_PRESIGN_SECONDS = 604_800;

type RawFacts = { ETag?: string | undefined; ContentLength?: number | undefined; ContentType?: string | undefined; LastModified?: Date | undefined };

const toFacts = (raw: RawFacts): ObjectFacts => ({
  sizeBytes: raw.ContentLength ?? 0,
  etag: (raw.ETag ?? "").replaceAll('"', ""),
  contentType: raw.ContentType ?? "application/octet-stream",
  modifiedAt: raw.LastModified ?? new Date(0),
});

function createClient(options: ObjectStoreOptions, endpoint: string): S3Client {
  return new S3Client({
    endpoint,
    region: options.region,
    forcePathStyle: options.forcePathStyle,
    credentials: { accessKeyId: options.accessKeyId, secretAccessKey: options.secretAccessKey },
    // Otherwise the client adds a checksum to what it presigns, and a browser can't send a body that fits it.
    requestChecksumCalculation: "WHEN_REQUIRED",
    responseChecksumValidation: "WHEN_REQUIRED",
  });
}

/** Makes the object store out of any S3-compatible service. See `ObjectStore` for what each function promises. */
export function createObjectStore(options: ObjectStoreOptions): ObjectStore {
  const { bucket } = options;
  const client = createClient(options, options.endpoint);
  const publicClient = options.publicEndpoint === options.endpoint ? client : createClient(options, options.publicEndpoint);
  const place = { client, bucket };
  const now = options.now ?? (() => new Date());

  async function headObject(key: string): Promise<ObjectFacts | undefined> {
    try {
      return toFacts(await callStore(() => client.send(new HeadObjectCommand({ Bucket: bucket, Key: key }))));
    } catch (error) {
      if (isMissing(error)) return undefined;
      throw error;
    }
  }

  async function getObject(key: string, range?: ObjectRange) {
    const Range = range && `bytes=${range.start}-${range.end ?? ""}`;
    const command = new GetObjectCommand({ Bucket: bucket, Key: key, Range });
    const answer = await callStore(() => client.send(command)).catch((error: unknown) => {
      if (isMissing(error)) throw new AppError("not_found", "That file is not in the store.");
      throw error;
    });
    if (!(answer.Body instanceof Readable)) throw new Error("The store answered without a body.");
    return { ...toFacts(answer), body: answer.Body };
  }

  async function deleteObjects(keys: readonly string[]): Promise<void> {
    for (let at = 0; at < keys.length; at += DELETED_AT_ONCE) {
      const Objects = keys.slice(at, at + DELETED_AT_ONCE).map((Key) => ({ Key }));
      const { Errors } = await callStore(() => client.send(new DeleteObjectsCommand({ Bucket: bucket, Delete: { Objects, Quiet: true } })));
      if (Errors?.length) throw new Error(`The store did not delete ${Errors.length} objects: ${Errors[0]?.Code ?? ""}`);
    }
  }

  async function presignGet(key: string, expiresSeconds: number, get: PresignGetOptions = {}): Promise<string> {
    const steadyMs = (get.steadySeconds ?? 3600) * 1000;
    const nowMs = now().getTime();
    const signedMs = steadyMs === 0 ? nowMs : Math.floor(nowMs / steadyMs) * steadyMs;
    const command = new GetObjectCommand({
      Bucket: bucket,
      Key: key,
      ResponseContentType: get.responseContentType,
      ResponseContentDisposition: get.responseContentDisposition,
    });
    // Dated back by up to `steadyMs`, so it must be good for that much longer.
    const expiresIn = Math.min(expiresSeconds + steadyMs / 1000, MAX_PRESIGN_SECONDS);
    return getSignedUrl(publicClient, command, { signingDate: new Date(signedMs), expiresIn });
  }

  return {
    headObject,
    getObject,
    deleteObjects,
    presignGet,

    async ensureBucket() {
      try {
        await callStore(() => client.send(new HeadBucketCommand({ Bucket: bucket })));
      } catch (error) {
        if (!isMissing(error)) throw error;
        await callStore(() => client.send(new CreateBucketCommand({ Bucket: bucket }))).catch((refused: unknown) => {
          if (errorCode(refused) !== "BucketAlreadyOwnedByYou") throw refused;
        });
      }
    },

    async putObject(key, body, { contentType, ifAbsent }) {
      const command = new PutObjectCommand({
        Bucket: bucket,
        Key: key,
        Body: body,
        ContentLength: Buffer.byteLength(body),
        ContentType: contentType,
        IfNoneMatch: ifAbsent ? "*" : undefined,
      });
      const { ETag } = await callStore(() => client.send(command)).catch((error: unknown) => {
        if (errorCode(error) === "PreconditionFailed") throw new AppError("conflict", "That file is in the store already.");
        throw error;
      });
      return { etag: (ETag ?? "").replaceAll('"', "") };
    },

    async downloadToFile(key, path) {
      const { body, ...facts } = await getObject(key);
      const unfinished = `${path}.${randomUUID()}.part`;
      try {
        await callStore(() => pipeline(body, createWriteStream(unfinished, { flags: "wx" })));
        if ((await stat(unfinished)).size !== facts.sizeBytes) throw new AppError("unavailable", "The file store broke off. Please try again.");
        await rename(unfinished, path);
      } finally {
        await rm(unfinished, { force: true });
      }
      return facts;
    },

    async uploadFromFile(key, path, { contentType }) {
      const { size } = await stat(path);
      if (size > ONE_PUT_BYTES) await uploadFileInParts(place, key, path, size, contentType);
      else {
        const Body = size === 0 ? "" : createReadStream(path, { highWaterMark: 1024 * 1024 });
        const command = new PutObjectCommand({ Bucket: bucket, Key: key, Body, ContentLength: size, ContentType: contentType });
        await callStore(() => client.send(command));
      }
      return { sizeBytes: size };
    },

    async *listKeys(prefix) {
      const pages = paginateListObjectsV2({ client }, { Bucket: bucket, Prefix: prefix });
      for (;;) {
        const page = await callStore(() => pages.next());
        if (page.done) return;
        for (const { Key } of page.value.Contents ?? []) if (Key !== undefined) yield Key;
      }
    },

    async deleteObject(key) {
      await callStore(() => client.send(new DeleteObjectCommand({ Bucket: bucket, Key: key })));
    },

    startMultipart: (key, { contentType }) => startMultipart(place, key, contentType),
    listParts: (key, uploadId) => listParts(place, key, uploadId),
    completeMultipart: (key, uploadId, expectedSizeBytes) =>
      completeMultipart(place, key, uploadId, expectedSizeBytes, () => headObject(key)),
    abortMultipart: (key, uploadId) => abortMultipart(place, key, uploadId),

    async presignPart(key, uploadId, partNumber, expiresSeconds, contentLength, checksum) {
      const command = new UploadPartCommand({
        Bucket: bucket,
        Key: key,
        UploadId: uploadId,
        PartNumber: partNumber,
        ContentLength: contentLength,
        ...(checksum ? { [`Checksum${checksum.algorithm}`]: checksum.value } : {}),
      });
      // Left as a header, and signed: stores differ in whether they heed a checksum that was moved into the query.
      const unhoistableHeaders = new Set(checksum ? [checksumHeader(checksum)[0]] : []);
      return getSignedUrl(publicClient, command, { expiresIn: expiresSeconds, signingDate: now(), unhoistableHeaders });
    },
  };
}
