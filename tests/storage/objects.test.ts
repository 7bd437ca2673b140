import {
  CopyObjectCommand, CreateBucketCommand, DeleteBucketCommand, DeleteObjectCommand, DeleteObjectsCommand, GetBucketLocationCommand,
  GetObjectCommand, HeadBucketCommand, HeadObjectCommand, ListBucketsCommand, PutObjectCommand, type ChecksumAlgorithm,
} from "@aws-sdk/client-s3";
import { createHash } from "node:crypto";
import { Readable } from "node:stream";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { sendRaw, sendSigned, signHeaders } from "./raw-request";
import { isOwnStore, openStoreUnderTest, type StoreUnderTest } from "./store-under-test";
import checksums from "./vectors/checksums.json";

let target: StoreUnderTest;
beforeAll(async () => { target = await openStoreUnderTest(); });
afterAll(() => target.close());

const md5 = (data: string | Buffer) => createHash("md5").update(data).digest("hex");
const pathOf = (key: string) => `/${target.bucket}/${key}`;
const put = (Key: string, Body: string | Buffer, more = {}) => target.client.send(new PutObjectCommand({ Bucket: target.bucket, Key, Body, ...more }));
const get = (Key: string, more = {}) => target.client.send(new GetObjectCommand({ Bucket: target.bucket, Key, ...more }));
const textOf = async (Key: string) => (await get(Key)).Body?.transformToString();

describe("an object", () => {
  test("comes back as it was put, with the MD5 of its bytes as ETag", async () => {
    const { ETag } = await put("plain", "Welcome to Amazon S3.", { ContentType: "text/plain", CacheControl: "no-store", Metadata: { colour: "red" } });
    expect(ETag).toBe(`"${md5("Welcome to Amazon S3.")}"`);
    const answer = await get("plain");
    expect(await answer.Body?.transformToString()).toBe("Welcome to Amazon S3.");
    expect(answer).toMatchObject({ ETag, ContentType: "text/plain", CacheControl: "no-store", ContentLength: 21, Metadata: { colour: "red" } });
    expect(answer.ContentEncoding).toBeUndefined();
  });

  test("may be empty", async () => {
    const { ETag } = await put("empty", "");
    expect(ETag).toBe('"d41d8cd98f00b204e9800998ecf8427e"');
    expect(await textOf("empty")).toBe("");
  });

  test("is replaced whole by a later one", async () => {
    await put("twice", "first and long");
    await put("twice", "second");
    expect(await textOf("twice")).toBe("second");
  });

  test("of several megabytes keeps every byte", async () => {
    const bytes = Buffer.from(Array.from({ length: 3_000_001 }, (_, index) => (index * 31) % 251));
    await put("large", bytes);
    expect(md5(Buffer.from((await (await get("large")).Body?.transformToByteArray()) ?? []))).toBe(md5(bytes));
  });

  test("is told of by HEAD, without a body", async () => {
    await put("head", "12345", { ContentType: "image/png" });
    const facts = await target.client.send(new HeadObjectCommand({ Bucket: target.bucket, Key: "head" }));
    expect(facts).toMatchObject({ ContentLength: 5, ContentType: "image/png", ETag: `"${md5("12345")}"`, AcceptRanges: "bytes" });
    expect((await sendSigned(target, { method: "HEAD", path: pathOf("head") })).body.length).toBe(0);
  });

  test("is gone once deleted, and deleting it again is no error", async () => {
    await put("short-lived", "x");
    for (const _ of [1, 2]) {
      const { $metadata } = await target.client.send(new DeleteObjectCommand({ Bucket: target.bucket, Key: "short-lived" }));
      expect($metadata.httpStatusCode).toBe(204);
    }
    await expect(get("short-lived")).rejects.toMatchObject({ name: "NoSuchKey", $metadata: { httpStatusCode: 404 } });
    await expect(target.client.send(new HeadObjectCommand({ Bucket: target.bucket, Key: "short-lived" }))).rejects.toMatchObject({ name: "NotFound" });
  });

  test("is read with the headers that the reader asks for", async () => {
    await put("override", "<p>", { ContentType: "text/html" });
    const answer = await get("override", { ResponseContentType: "text/plain", ResponseContentDisposition: 'attachment; filename="a b.txt"' });
    expect(answer).toMatchObject({ ContentType: "text/plain", ContentDisposition: 'attachment; filename="a b.txt"' });
  });

  test("is copied, with its headers or with new ones", async () => {
    await put("from here/ü", "to copy", { ContentType: "text/plain" });
    const CopySource = `${target.bucket}/${encodeURIComponent("from here/ü")}`;
    const { CopyObjectResult } = await target.client.send(new CopyObjectCommand({ Bucket: target.bucket, Key: "copy", CopySource }));
    expect(CopyObjectResult?.ETag).toBe(`"${md5("to copy")}"`);
    expect(await get("copy")).toMatchObject({ ContentType: "text/plain", ContentLength: 7 });
    await target.client.send(new CopyObjectCommand({
      Bucket: target.bucket, Key: "copy", CopySource, MetadataDirective: "REPLACE", ContentType: "text/css",
    }));
    expect(await get("copy")).toMatchObject({ ContentType: "text/css" });
  });
});

test.each([
  "a b+c&d=e?f#g%25", "../../../etc/passwd", "/leading", "double//slash", ".", "con", "ümläut/日本語/🔧", "quote'\"<>&", "trailing/", "a".repeat(1024),
  "line\nfeed", "back\\slash", "%2e%2e",
])("keeps the odd key %j", async (key) => {
  await put(key, `body of ${key}`);
  expect(await textOf(key)).toBe(`body of ${key}`);
  const { Deleted } = await target.client.send(new DeleteObjectsCommand({ Bucket: target.bucket, Delete: { Objects: [{ Key: key }] } }));
  expect(Deleted).toEqual([{ Key: key }]);
  await expect(get(key)).rejects.toMatchObject({ name: "NoSuchKey" });
});

test("refuses a key of more than 1024 bytes", async () => {
  await expect(put("a".repeat(1025), "x")).rejects.toMatchObject({ name: "KeyTooLongError" });
});

describe("digests", () => {
  // Source: vectors/checksums.json.
  const text = "Welcome to Amazon S3.";
  const published = checksums.cases.find(({ name }) => name === text)?.base64;
  test.each([["CRC32", published?.crc32], ["CRC32C", published?.crc32c], ["CRC64NVME", published?.crc64nvme]] as const)(
    "%s is checked, kept and given back",
    async (algorithm, value) => {
      const field = `Checksum${algorithm}`;
      await put(algorithm, text, { ChecksumAlgorithm: algorithm as ChecksumAlgorithm, [field]: value });
      expect(await get(algorithm, { ChecksumMode: "ENABLED" })).toHaveProperty(field, value);
      const wrong = `${value?.startsWith("A") ? "B" : "A"}${value?.slice(1)}`;
      await expect(put(`${algorithm}-wrong`, text, { [field]: wrong })).rejects.toMatchObject({ name: expect.stringMatching(/BadDigest|InvalidRequest/) });
      await expect(get(`${algorithm}-wrong`)).rejects.toMatchObject({ name: "NoSuchKey" });
    },
  );

  test("a stream with its checksum in a trailer is decoded and checked", async () => {
    const Body = Readable.from([Buffer.from("Welcome to "), Buffer.from("Amazon S3.")]);
    await put("trailer", Body as unknown as Buffer, { ContentLength: 21, ChecksumAlgorithm: "CRC32" });
    const answer = await get("trailer", { ChecksumMode: "ENABLED" });
    expect(await answer.Body?.transformToString()).toBe(text);
    expect(answer.ChecksumCRC32).toBe(published?.crc32);
  });

  const putRaw = (headers: Record<string, string>, body: string, payloadHash?: string) =>
    sendSigned(target, { method: "PUT", path: pathOf("digest"), headers, body, ...(payloadHash === undefined ? {} : { payloadHash }) });

  test("a wrong trailer is refused, and one that was announced and isn't there", async () => {
    const headers = { "x-amz-decoded-content-length": "5", "x-amz-trailer": "x-amz-checksum-crc32", "content-encoding": "aws-chunked" };
    const wrong = await putRaw(headers, "5\r\nhello\r\n0\r\nx-amz-checksum-crc32:AAAAAA==\r\n\r\n", "STREAMING-UNSIGNED-PAYLOAD-TRAILER");
    expect(wrong).toMatchObject({ status: 400, code: "BadDigest" });
    const missing = await putRaw(headers, "5\r\nhello\r\n0\r\n\r\n", "STREAMING-UNSIGNED-PAYLOAD-TRAILER");
    expect(missing).toMatchObject({ status: 400, code: "MalformedTrailerError" });
  });

  test("Content-MD5 is checked", async () => {
    const value = createHash("md5").update("hello").digest("base64");
    expect((await putRaw({ "content-md5": value }, "hello")).status).toBe(200);
    expect((await putRaw({ "content-md5": value }, "jello")).code).toBe("BadDigest");
    expect((await putRaw({ "content-md5": "short" }, "hello")).code).toBe("InvalidDigest");
  });

  test("the signed hash of the body is checked, and nothing is kept of a body that doesn't fit", async () => {
    const other = createHash("sha256").update("other").digest("hex");
    const answer = await sendSigned(target, { method: "PUT", path: pathOf("tampered"), body: "hello", payloadHash: other });
    expect(answer).toMatchObject({ status: 400, code: "XAmzContentSHA256Mismatch" });
    await expect(get("tampered")).rejects.toMatchObject({ name: "NoSuchKey" });
  });
});

describe("conditions", () => {
  test("If-None-Match: * writes only what isn't there", async () => {
    await put("once", "first", { IfNoneMatch: "*" });
    await expect(put("once", "second", { IfNoneMatch: "*" })).rejects.toMatchObject({ name: "PreconditionFailed" });
    expect(await textOf("once")).toBe("first");
  });

  test("of many at once exactly one wins", async () => {
    const writes = await Promise.allSettled(Array.from({ length: 8 }, (_, index) => put("race", `writer ${index}`, { IfNoneMatch: "*" })));
    expect(writes.filter(({ status }) => status === "fulfilled")).toHaveLength(1);
  });

  test("If-Match writes over the same object only", async () => {
    const { ETag } = await put("matched", "one");
    await put("matched", "two", { IfMatch: ETag });
    await expect(put("matched", "three", { IfMatch: ETag })).rejects.toMatchObject({ name: "PreconditionFailed" });
    await expect(put("matched-nothing", "x", { IfMatch: ETag })).rejects.toMatchObject({ name: "NoSuchKey" });
  });

  // Source: RFC 9110, section 13.2.2.
  test("reading: 304 for the same, 412 for another, in the standard's order", async () => {
    const { ETag = "" } = await put("read", "x");
    const read = async (headers: Record<string, string>) => (await sendSigned(target, { method: "GET", path: pathOf("read"), headers })).status;
    const [past, future] = ["Wed, 01 Jan 2020 00:00:00 GMT", "Fri, 01 Jan 2100 00:00:00 GMT"];
    expect(await read({ "if-none-match": ETag })).toBe(304);
    expect(await read({ "if-none-match": '"other"' })).toBe(200);
    expect(await read({ "if-match": ETag })).toBe(200);
    expect(await read({ "if-match": '"other"' })).toBe(412);
    expect(await read({ "if-unmodified-since": past })).toBe(412);
    expect(await read({ "if-match": ETag, "if-unmodified-since": past })).toBe(200);
    expect(await read({ "if-modified-since": past })).toBe(200);
    if (isOwnStore) expect(await read({ "if-modified-since": future })).toBe(304);
    expect(await read({ "if-none-match": '"other"', "if-modified-since": future })).toBe(200);
  });
});

describe("many at once", () => {
  test("deletes what is listed and says so, quietly if asked", async () => {
    for (const key of ["m/1", "m/2", "m/3"]) await put(key, "x");
    const remove = (keys: string[], Quiet: boolean) =>
      target.client.send(new DeleteObjectsCommand({ Bucket: target.bucket, Delete: { Objects: keys.map((Key) => ({ Key })), Quiet } }));
    expect((await remove(["m/1", "m/none"], false)).Deleted?.map(({ Key }) => Key).sort()).toEqual(["m/1", "m/none"]);
    expect((await remove(["m/2", "m/3"], true)).Deleted ?? []).toEqual([]);
    await expect(get("m/2")).rejects.toMatchObject({ name: "NoSuchKey" });
  });

  test("wants a digest of the list, and a list", async () => {
    const send = (body: string, headers = {}) => sendSigned(target, { method: "POST", path: `/${target.bucket}`, query: "delete=", body, headers });
    const body = "<Delete><Object><Key>x</Key></Object></Delete>";
    expect((await send(body)).code).toMatch(/InvalidRequest|MissingContentMD5/);
    const digest = (text: string) => ({ "content-md5": createHash("md5").update(text).digest("base64") });
    expect((await send("<Delete><Object>", digest("<Delete><Object>"))).code).toBe("MalformedXML");
    expect((await send("<Delete></Delete>", digest("<Delete></Delete>"))).code).toBe("MalformedXML");
  });
});

describe("buckets", () => {
  test("are made, found, listed and removed when empty", async () => {
    const Bucket = `${target.bucket}-more`;
    await expect(target.client.send(new HeadBucketCommand({ Bucket }))).rejects.toMatchObject({ $metadata: { httpStatusCode: 404 } });
    await target.client.send(new CreateBucketCommand({ Bucket }));
    await target.client.send(new HeadBucketCommand({ Bucket }));
    await target.client.send(new GetBucketLocationCommand({ Bucket }));
    expect((await target.client.send(new ListBucketsCommand({}))).Buckets?.map(({ Name }) => Name)).toContain(Bucket);
    await target.client.send(new PutObjectCommand({ Bucket, Key: "x", Body: "x" }));
    await expect(target.client.send(new DeleteBucketCommand({ Bucket }))).rejects.toMatchObject({ name: "BucketNotEmpty" });
    await target.client.send(new DeleteObjectCommand({ Bucket, Key: "x" }));
    await target.client.send(new DeleteBucketCommand({ Bucket }));
    await expect(target.client.send(new PutObjectCommand({ Bucket, Key: "x", Body: "x" }))).rejects.toMatchObject({ name: "NoSuchBucket" });
  });

  test.each(["UPPER", "ab", "a..b", "-a-", "192.168.0.1"])("refuses the name %s", async (name) => {
    expect((await sendSigned(target, { method: "PUT", path: `/${name}` })).code).toBe("InvalidBucketName");
  });
});

describe("refusals", () => {
  test("answer in XML, with code, resource and request id", async () => {
    const answer = await sendSigned(target, { method: "GET", path: pathOf("none") });
    expect(answer).toMatchObject({ status: 404, code: "NoSuchKey" });
    expect(answer.headers["content-type"]).toContain("application/xml");
    expect(answer.text).toMatch(/^<\?xml[^>]*>\s*<Error><Code>NoSuchKey<\/Code><Message>.*<RequestId>.+<\/RequestId>/s);
  });

  test("nothing without a signature", async () => {
    await put("secret", "x");
    expect(await sendRaw(`${target.endpoint}${pathOf("secret")}`, { method: "GET" })).toMatchObject({ status: 403, code: "AccessDenied" });
    expect(await sendRaw(`${target.endpoint}${pathOf("new")}`, { method: "PUT", body: "x" })).toMatchObject({ status: 403, code: "AccessDenied" });
  });

  test("an old signature, a stranger's key and a wrong secret", async () => {
    const old = await sendSigned(target, { method: "GET", path: pathOf("x"), date: new Date(Date.now() - 16 * 60_000) });
    expect(old).toMatchObject({ status: 403, code: "RequestTimeTooSkewed" });
    const as = (credentials: StoreUnderTest["credentials"]) => sendSigned({ ...target, credentials }, { method: "GET", path: pathOf("x") });
    expect((await as({ ...target.credentials, accessKeyId: "STRANGER" })).code).toBe("InvalidAccessKeyId");
    expect((await as({ ...target.credentials, secretAccessKey: "wrong" })).code).toBe("SignatureDoesNotMatch");
  });

  test("a body without a length", async () => {
    const headers = { ...signHeaders(target, { method: "PUT", path: pathOf("x"), payloadHash: "UNSIGNED-PAYLOAD" }), "transfer-encoding": "chunked" };
    const answer = await sendRaw(`${target.endpoint}${pathOf("x")}`, { method: "PUT", headers, body: "hello" });
    expect(answer).toMatchObject({ status: 411, code: "MissingContentLength" });
  });

  test("a refused body is not asked for when the client waits to be told", async () => {
    const headers = { expect: "100-continue", "content-length": "1000000" };
    const answer = await sendRaw(`${target.endpoint}${pathOf("x")}`, { method: "PUT", headers, body: Buffer.alloc(1_000_000) });
    expect(answer.status).toBe(403);
  });

  test.runIf(isOwnStore)("what the store does not serve is said, not guessed", async () => {
    for (const query of ["acl=", "tagging=", "versionId=1"]) {
      expect(await sendSigned(target, { method: "GET", path: pathOf("secret"), query })).toMatchObject({ status: 501, code: "NotImplemented" });
    }
    expect((await sendSigned(target, { method: "POST", path: pathOf("secret") })).status).toBe(405);
  });
});
