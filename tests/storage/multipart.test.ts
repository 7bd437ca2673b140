import {
  AbortMultipartUploadCommand, CompleteMultipartUploadCommand, CreateMultipartUploadCommand, GetObjectCommand, HeadObjectCommand,
  ListMultipartUploadsCommand, ListPartsCommand, UploadPartCommand,
} from "@aws-sdk/client-s3";
import { createHash } from "node:crypto";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { sendSigned } from "./raw-request";
import { openStoreUnderTest, type StoreUnderTest } from "./store-under-test";
import vectors from "./vectors/multipart-etag.json";

let target: StoreUnderTest;
beforeAll(async () => { target = await openStoreUnderTest(); });
afterAll(() => target.close());

const MIB = 1024 * 1024;
const ramp = (sizeBytes: number) => Buffer.from(Uint8Array.from({ length: sizeBytes }, (_, index) => (index * 31) % 256));

async function begin(Key: string, more = {}) {
  const at = { Bucket: target.bucket, Key };
  const { UploadId } = await target.client.send(new CreateMultipartUploadCommand({ ...at, ...more }));
  const upload = { ...at, UploadId };
  return {
    upload,
    part: (PartNumber: number, Body: Buffer, extra = {}) => target.client.send(new UploadPartCommand({ ...upload, PartNumber, Body, ...extra })),
    list: (extra = {}) => target.client.send(new ListPartsCommand({ ...upload, ...extra })),
    abort: () => target.client.send(new AbortMultipartUploadCommand(upload)),
    complete: (parts: [number, string | undefined][], extra = {}) =>
      target.client.send(new CompleteMultipartUploadCommand({
        ...upload, MultipartUpload: { Parts: parts.map(([PartNumber, ETag]) => ({ PartNumber, ETag })) }, ...extra,
      })),
  };
}

// Source: vectors/multipart-etag.json.
test.each(vectors.cases)("$name: parts, ETag and bytes", async ({ name, size, partSize, parts, etag, wholeSha256 }) => {
  const bytes = name.includes("0x00") ? Buffer.alloc(size) : ramp(size);
  const { part, complete } = await begin(`vector ${name}`, { ContentType: "video/mp4" });
  const done: [number, string | undefined][] = [];
  for (const { number, md5 } of parts) {
    const { ETag } = await part(number, bytes.subarray((number - 1) * partSize, number * partSize));
    expect(ETag).toBe(`"${md5}"`);
    done.push([number, ETag]);
  }
  expect((await complete(done)).ETag).toBe(etag);
  const answer = await target.client.send(new GetObjectCommand({ Bucket: target.bucket, Key: `vector ${name}` }));
  expect(answer).toMatchObject({ ETag: etag, ContentLength: size, ContentType: "video/mp4" });
  expect(createHash("sha256").update((await answer.Body?.transformToByteArray()) ?? "").digest("hex")).toBe(wholeSha256);
});

test("a range may begin in one part and end in another", async () => {
  const bytes = ramp(10 * MIB + 5);
  const { part, complete } = await begin("across");
  const etags = await Promise.all([0, 1, 2].map(async (index) => (await part(index + 1, bytes.subarray(index * 5 * MIB, (index + 1) * 5 * MIB))).ETag));
  await complete(etags.map((etag, index) => [index + 1, etag]));
  for (const [from, to] of [[5 * MIB - 3, 5 * MIB + 2], [4 * MIB, 10 * MIB + 4], [10 * MIB, 10 * MIB], [0, 10 * MIB + 4]] as const) {
    const { Body } = await target.client.send(new GetObjectCommand({ Bucket: target.bucket, Key: "across", Range: `bytes=${from}-${to}` }));
    expect(bytes.subarray(from, to + 1).equals(Buffer.from((await Body?.transformToByteArray()) ?? []))).toBe(true);
  }
});

test("parts are listed in order, in pages, and the last one sent of a number counts", async () => {
  const { part, list, abort } = await begin("paged");
  for (const number of [5, 3, 1, 4, 2]) await part(number, Buffer.from(`part ${number}`));
  await part(3, Buffer.from("part three again"));
  const first = await list({ MaxParts: 2 });
  expect(first.Parts?.map(({ PartNumber }) => PartNumber)).toEqual([1, 2]);
  expect(first).toMatchObject({ IsTruncated: true, NextPartNumberMarker: "2" });
  const rest = await list({ PartNumberMarker: "2" });
  expect(rest.Parts?.map(({ PartNumber, Size }) => [PartNumber, Size])).toEqual([[3, 16], [4, 6], [5, 6]]);
  expect(rest.IsTruncated).toBe(false);
  await abort();
});

describe("completing is refused", () => {
  const small = Buffer.from("small");
  test("for a part that isn't there or has another ETag", async () => {
    const { part, complete, abort } = await begin("invalid part");
    const { ETag } = await part(1, small);
    await expect(complete([[1, '"00000000000000000000000000000000"']])).rejects.toMatchObject({ name: "InvalidPart" });
    await expect(complete([[1, ETag], [2, ETag]])).rejects.toMatchObject({ name: "InvalidPart" });
    await abort();
  });

  test("for parts out of order", async () => {
    const { part, complete, abort } = await begin("order");
    const [one, two] = [await part(1, Buffer.alloc(5 * MIB)), await part(2, small)];
    await expect(complete([[2, two.ETag], [1, one.ETag]])).rejects.toMatchObject({ name: "InvalidPartOrder" });
    await abort();
  });

  // Source: Amazon S3 user guide, "Amazon S3 multipart upload limits": 5 MiB, no minimum on the last part.
  test("for a part under 5 MiB that isn't the last, and the upload goes on", async () => {
    const { part, complete } = await begin("too small");
    const [one, two] = [await part(1, Buffer.alloc(5 * MIB - 1)), await part(2, small)];
    await expect(complete([[1, one.ETag], [2, two.ETag]])).rejects.toMatchObject({ name: "EntityTooSmall" });
    const again = await part(1, Buffer.alloc(5 * MIB));
    expect((await complete([[1, again.ETag], [2, two.ETag]])).ETag).toMatch(/-2"$/);
  });

  test("for no parts, or no XML", async () => {
    const { upload, abort } = await begin("malformed");
    const send = (body: string) =>
      sendSigned(target, { method: "POST", path: `/${upload.Bucket}/${upload.Key}`, query: `uploadId=${upload.UploadId}`, body });
    expect((await send("<CompleteMultipartUpload></CompleteMultipartUpload>")).code).toBe("MalformedXML");
    expect((await send("not xml")).code).toBe("MalformedXML");
    await abort();
  });

  test("twice: the second finds no upload, and the object stays", async () => {
    const { part, complete } = await begin("only once");
    const { ETag } = await part(1, small);
    const results = await Promise.allSettled([complete([[1, ETag]]), complete([[1, ETag]])]);
    expect(results.some(({ status }) => status === "fulfilled")).toBe(true);
    const { ContentLength } = await target.client.send(new HeadObjectCommand({ Bucket: target.bucket, Key: "only once" }));
    expect(ContentLength).toBe(small.length);
  });
});

test("a part number lies between 1 and 10000", async () => {
  const { upload, part, abort } = await begin("numbers");
  expect((await part(10_000, Buffer.from("x"))).ETag).toBeDefined();
  for (const number of [0, 10_001, "x"]) {
    const query = `partNumber=${number}&uploadId=${upload.UploadId}`;
    expect((await sendSigned(target, { method: "PUT", path: `/${upload.Bucket}/${upload.Key}`, query, body: "x" })).code).toBe("InvalidArgument");
  }
  await abort();
});

test("after an abort nothing takes parts, lists or completes", async () => {
  const { part, list, complete, abort } = await begin("aborted");
  const { ETag } = await part(1, Buffer.from("x"));
  await abort();
  for (const call of [() => part(2, Buffer.from("y")), () => list(), () => complete([[1, ETag]]), () => abort()]) {
    await expect(call()).rejects.toMatchObject({ name: "NoSuchUpload" });
  }
});

test("an upload's id is of use for its own key only", async () => {
  const { upload, abort } = await begin("mine");
  const query = `partNumber=1&uploadId=${upload.UploadId}`;
  expect((await sendSigned(target, { method: "PUT", path: `/${upload.Bucket}/other`, query, body: "x" })).code).toBe("NoSuchUpload");
  await abort();
});

test("open uploads are listed, in pages and by prefix", async () => {
  const uploads = [await begin("open/b"), await begin("open/a"), await begin("open/a"), await begin("shut")];
  const found: (string | undefined)[] = [];
  let markers: { KeyMarker?: string | undefined; UploadIdMarker?: string | undefined } = {};
  for (;;) {
    const page = await target.client.send(new ListMultipartUploadsCommand({ Bucket: target.bucket, Prefix: "open/", MaxUploads: 1, ...markers }));
    found.push(...(page.Uploads ?? []).map(({ Key }) => Key));
    if (!page.IsTruncated) break;
    markers = { KeyMarker: page.NextKeyMarker, UploadIdMarker: page.NextUploadIdMarker };
  }
  expect(found).toEqual(["open/a", "open/a", "open/b"]);
  for (const { abort } of uploads) await abort();
});

describe("checksums of parts", () => {
  const parts = [ramp(5 * MIB), Buffer.from("the end")];

  test("SHA-256 is checked for each part and joined for the object", async () => {
    const { part, complete } = await begin("sha256", { ChecksumAlgorithm: "SHA256" });
    const digests = parts.map((bytes) => createHash("sha256").update(bytes).digest());
    await expect(part(1, parts[1] ?? Buffer.alloc(0), { ChecksumSHA256: digests[0]?.toString("base64") })).rejects.toThrow();
    const sent = await Promise.all(parts.map((bytes, index) => part(index + 1, bytes, { ChecksumSHA256: digests[index]?.toString("base64") })));
    const Parts = sent.map(({ ETag }, index) => ({ ETag, PartNumber: index + 1, ChecksumSHA256: digests[index]?.toString("base64") }));
    const done = await complete([], { MultipartUpload: { Parts } });
    expect(done.ChecksumSHA256).toBe(`${createHash("sha256").update(Buffer.concat(digests)).digest("base64")}-2`);
  });

  // The whole's SHA-256 says that the bytes are right; CRC32 of them by zlib, which is not our code, where Node has it.
  test("CRC32 of the whole object is worked out from its parts", async () => {
    const zlib: { crc32?: (data: Buffer) => number } = await import("node:zlib");
    const { part, complete } = await begin("crc32", { ChecksumAlgorithm: "CRC32", ChecksumType: "FULL_OBJECT" });
    const sent: Awaited<ReturnType<typeof part>>[] = [];
    for (const [index, bytes] of parts.entries()) sent.push(await part(index + 1, bytes, { ChecksumAlgorithm: "CRC32" }));
    const Parts = sent.map(({ ETag, ChecksumCRC32 }, index) => ({ ETag, ChecksumCRC32, PartNumber: index + 1 }));
    const done = await complete([], { MultipartUpload: { Parts }, ChecksumType: "FULL_OBJECT" });
    expect(Buffer.from(done.ChecksumCRC32 ?? "", "base64")).toHaveLength(4);
    if (zlib.crc32) expect(Buffer.from(done.ChecksumCRC32 ?? "", "base64").readUInt32BE()).toBe(zlib.crc32(Buffer.concat(parts)));
  });
});
