import fc from "fast-check";
import { createHash, randomBytes } from "node:crypto";
import { mkdtemp, readFile, readdir, rm, writeFile } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { checksumHeader } from "@/storage/objects";
import { createObjectStore } from "@/storage/s3";
import { sendRaw } from "./raw-request";
import { isOwnStore, openStoreUnderTest, type StoreUnderTest } from "./store-under-test";

let target: StoreUnderTest;
let folder: string;
beforeAll(async () => {
  target = await openStoreUnderTest();
  folder = await mkdtemp(join(tmpdir(), "files-"));
});
afterAll(async () => {
  await rm(folder, { recursive: true, force: true });
  await target.close();
});

const MIB = 1024 * 1024;
const sha256 = (data: Buffer) => createHash("sha256").update(data).digest();
const putPart = (url: string, body: Buffer, headers = {}) =>
  sendRaw(url, { method: "PUT", headers: { "content-length": String(body.length), ...headers }, body });

async function read(key: string, range?: { start: number; end?: number }): Promise<string> {
  const chunks: Buffer[] = [];
  for await (const chunk of (await target.store.getObject(key, range)).body) chunks.push(chunk as Buffer);
  return Buffer.concat(chunks).toString();
}

describe("objects", () => {
  test("are put, told of, read whole and in part, and deleted", async () => {
    const { etag } = await target.store.putObject("note", "0123456789", { contentType: "text/plain" });
    expect(await target.store.headObject("note")).toMatchObject({ sizeBytes: 10, etag, contentType: "text/plain" });
    expect([await read("note"), await read("note", { start: 2, end: 4 }), await read("note", { start: 8 })]).toEqual(["0123456789", "234", "89"]);
    await target.store.deleteObject("note");
    expect(await target.store.headObject("note")).toBeUndefined();
    await expect(target.store.getObject("note")).rejects.toMatchObject({ code: "not_found" });
  });

  test("are not written over if they must be new", async () => {
    await target.store.putObject("new", "one", { contentType: "text/plain", ifAbsent: true });
    const again = target.store.putObject("new", "two", { contentType: "text/plain", ifAbsent: true });
    await expect(again).rejects.toMatchObject({ code: "conflict" });
  });

  test("are listed and deleted by prefix, over a thousand of them", async () => {
    const keys = Array.from({ length: 1003 }, (_, index) => `many/${String(index).padStart(4, "0")}`);
    for (let at = 0; at < keys.length; at += 20) {
      await Promise.all(keys.slice(at, at + 20).map((key) => target.store.putObject(key, "x", { contentType: "text/plain" })));
    }
    const found: string[] = [];
    for await (const key of target.store.listKeys("many/")) found.push(key);
    expect(found).toEqual(keys);
    await target.store.deleteObjects(found);
    for await (const key of target.store.listKeys("many/")) expect(key).toBe("nothing is left");
  });
});

describe("files", () => {
  test.each([0, 1, 3 * MIB + 7, 64 * MIB + 1])("of %i bytes go up and come down the same", async (sizeBytes) => {
    const bytes = randomBytes(sizeBytes);
    const [from, to] = [join(folder, "from"), join(folder, "to")];
    await writeFile(from, bytes);
    expect(await target.store.uploadFromFile("file", from, { contentType: "video/mp4" })).toEqual({ sizeBytes });
    expect(await target.store.downloadToFile("file", to)).toMatchObject({ sizeBytes, contentType: "video/mp4" });
    expect(sha256(await readFile(to))).toEqual(sha256(bytes));
  });

  test("nothing is left behind of a download that failed", async () => {
    await expect(target.store.downloadToFile("none", join(folder, "none"))).rejects.toMatchObject({ code: "not_found" });
    expect((await readdir(folder)).filter((name) => name.startsWith("none"))).toEqual([]);
  });
});

describe("an upload by presigned parts", () => {
  const bytes = randomBytes(5 * MIB + 1000);
  const parts = [bytes.subarray(0, 5 * MIB), bytes.subarray(5 * MIB)];

  test("becomes the object out of what the store has, and completing it twice is safe", async () => {
    const { uploadId } = await target.store.startMultipart("film", { contentType: "video/mp4" });
    for (const [index, part] of parts.entries()) {
      const url = await target.store.presignPart("film", uploadId, index + 1, 600, part.length);
      expect((await putPart(url, part)).status).toBe(200);
    }
    expect((await target.store.listParts("film", uploadId)).map(({ partNumber, sizeBytes }) => [partNumber, sizeBytes])).toEqual([[1, 5 * MIB], [2, 1000]]);
    const facts = await target.store.completeMultipart("film", uploadId, bytes.length);
    expect(facts).toMatchObject({ sizeBytes: bytes.length, contentType: "video/mp4" });
    expect(await target.store.completeMultipart("film", uploadId, bytes.length)).toEqual(facts);
    const [one, two] = await Promise.all([target.store.getObject("film"), target.store.headObject("film")]);
    one.body.destroy();
    expect(two).toEqual(facts);
  });

  test("completed from two tabs at once gives both the same object", async () => {
    const { uploadId } = await target.store.startMultipart("tabs", { contentType: "video/mp4" });
    await putPart(await target.store.presignPart("tabs", uploadId, 1, 600), parts[1] ?? Buffer.alloc(0));
    const [one, two] = await Promise.all([1, 2].map(() => target.store.completeMultipart("tabs", uploadId, 1000)));
    expect(one).toEqual(two);
  });

  test("is not completed while a part is missing, or the sizes don't add up", async () => {
    const { uploadId } = await target.store.startMultipart("gap", { contentType: "video/mp4" });
    await expect(target.store.completeMultipart("gap", uploadId, 1000)).rejects.toMatchObject({ code: "conflict" });
    await putPart(await target.store.presignPart("gap", uploadId, 2, 600), parts[1] ?? Buffer.alloc(0));
    await expect(target.store.completeMultipart("gap", uploadId, 1000)).rejects.toMatchObject({ code: "conflict" });
    await putPart(await target.store.presignPart("gap", uploadId, 1, 600), Buffer.from("too small"));
    await expect(target.store.completeMultipart("gap", uploadId, 1010)).rejects.toMatchObject({ code: "conflict" });
    await expect(target.store.completeMultipart("gap", uploadId, 1009)).rejects.toMatchObject({ code: "conflict" });
    await target.store.abortMultipart("gap", uploadId);
    await target.store.abortMultipart("gap", uploadId);
    await expect(target.store.listParts("gap", uploadId)).rejects.toMatchObject({ code: "gone" });
    await expect(target.store.completeMultipart("gap", uploadId, 1009)).rejects.toMatchObject({ code: "gone" });
  });

  test("lists more than one page of parts", async () => {
    const { uploadId } = await target.store.startMultipart("pages", { contentType: "video/mp4" });
    for (let at = 1; at <= 1002; at += 34) {
      await Promise.all(Array.from({ length: Math.min(34, 1003 - at) }, async (_, index) =>
        putPart(await target.store.presignPart("pages", uploadId, at + index, 600), Buffer.from(String(at + index)))));
    }
    const numbers = (await target.store.listParts("pages", uploadId)).map(({ partNumber }) => partNumber);
    expect(numbers).toEqual(Array.from({ length: 1002 }, (_, index) => index + 1));
    await target.store.abortMultipart("pages", uploadId);
  });

  test("takes no part of another length, number, upload or checksum than was signed", async () => {
    const { uploadId } = await target.store.startMultipart("bound", { contentType: "video/mp4" });
    const body = Buffer.from("0123456789");
    const url = await target.store.presignPart("bound", uploadId, 1, 600, 10);
    expect((await putPart(url, Buffer.from("0123456789X"))).status).toBe(403);
    expect((await putPart(url.replace("partNumber=1", "partNumber=2"), body)).status).toBe(403);
    expect((await putPart(url.replace(uploadId, "other"), body)).status).toBe(403);
    expect((await putPart(url, body)).status).toBe(200);

    const checksum = { algorithm: "SHA256", value: sha256(body).toString("base64") } as const;
    const bound = await target.store.presignPart("bound", uploadId, 1, 600, 10, checksum);
    const [name, value] = checksumHeader(checksum);
    expect((await putPart(bound, Buffer.from("9876543210"), { [name]: value })).code).toBe("BadDigest");
    expect((await putPart(bound, body)).status).toBe(403);
    expect((await putPart(bound, body, { [name]: value })).status).toBe(200);
    await target.store.abortMultipart("bound", uploadId);
  });

  test("needs no header but those that a browser sends by itself", async () => {
    const url = new URL(await target.store.presignPart("plain", "id", 1, 600, 10));
    expect(url.searchParams.get("X-Amz-SignedHeaders")).toBe("content-length;host");
    expect([...url.searchParams.keys()].filter((name) => /checksum/i.test(name))).toEqual([]);
  });
});

describe("an address to read from", () => {
  const at = (iso: string) => createObjectStore({ ...target.options, now: () => new Date(iso) });

  test("stays the same within the hour, changes with the next, and is good for as long as asked in between", async () => {
    const early = await at("2026-12-01T10:00:00Z").presignGet("film", 4 * 3600);
    const late = await at("2026-12-01T10:59:59.999Z").presignGet("film", 4 * 3600);
    const next = await at("2026-12-01T11:00:00Z").presignGet("film", 4 * 3600);
    expect(late).toBe(early);
    expect(next).not.toBe(early);
    expect(new URL(early).searchParams.get("X-Amz-Date")).toBe("20261201T100000Z");
    expect(new URL(early).searchParams.get("X-Amz-Expires")).toBe(String(5 * 3600));
  });

  test("is at any moment good for at least what was asked", async () => {
    await fc.assert(fc.asyncProperty(fc.integer({ min: 0, max: 10 ** 9 }), fc.integer({ min: 1, max: 86_400 }), fc.constantFrom(0, 60, 3600), async (offsetSeconds, expires, steadySeconds) => {
      const nowMs = Date.parse("2026-12-01T00:00:00Z") + offsetSeconds * 1000;
      const store = createObjectStore({ ...target.options, now: () => new Date(nowMs) });
      const { searchParams } = new URL(await store.presignGet("film", expires, { steadySeconds }));
      const date = (searchParams.get("X-Amz-Date") ?? "").replace(/(....)(..)(..T..)(..)(..Z)/, "$1-$2-$3:$4:$5");
      expect(Date.parse(date) + Number(searchParams.get("X-Amz-Expires")) * 1000).toBeGreaterThanOrEqual(nowMs + expires * 1000);
      expect(Date.parse(date)).toBeLessThanOrEqual(nowMs);
    }), { numRuns: 30 });
  });

  test("is signed for where browsers reach the store", async () => {
    const store = createObjectStore({ ...target.options, publicEndpoint: "https://files.example" });
    expect(await store.presignGet("a b", 60)).toMatch(new RegExp(`^https://files\\.example/${target.bucket}/a%20b\\?`));
    expect(await store.presignPart("a", "id", 1, 60)).toMatch(/^https:\/\/files\.example\//);
  });

  test("gives the bytes, with the type and the file name that were asked for, and no other", async () => {
    await target.store.putObject("given", "0123456789", { contentType: "text/html" });
    const url = await target.store.presignGet("given", 60, {
      responseContentType: "video/mp4", responseContentDisposition: 'attachment; filename="step 1.mp4"',
    });
    const answer = await sendRaw(url, { method: "GET", headers: { range: "bytes=3-5" } });
    expect(answer).toMatchObject({ status: 206, text: "345" });
    expect(answer.headers).toMatchObject({ "content-type": "video/mp4", "content-disposition": 'attachment; filename="step 1.mp4"' });
    expect((await sendRaw(url.replace("video%2Fmp4", "text%2Fhtml"), { method: "GET" })).code).toBe("SignatureDoesNotMatch");
    expect((await sendRaw(url, { method: "PUT", body: "x" })).code).toBe("SignatureDoesNotMatch");
  });

  test("ends", async () => {
    const url = await at(new Date(Date.now() - 3600_000).toISOString()).presignGet("given", 60, { steadySeconds: 0 });
    expect(await sendRaw(url, { method: "GET" })).toMatchObject({ status: 403, code: "AccessDenied" });
  });
});

test("a bucket is made once, from however many sides", async () => {
  const store = createObjectStore({ ...target.options, bucket: `${target.bucket}-new` });
  await Promise.all([store.ensureBucket(), store.ensureBucket()]);
  await store.putObject("x", "x", { contentType: "text/plain" });
  expect((await store.headObject("x"))?.sizeBytes).toBe(1);
  if (!isOwnStore) await store.deleteObject("x");
});

test("a store that can't be reached is told in one sentence", async () => {
  const store = createObjectStore({ ...target.options, endpoint: "http://127.0.0.1:9" });
  await expect(store.headObject("x")).rejects.toMatchObject({ code: "unavailable", name: "AppError" });
});
