import { createHash } from "node:crypto";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { readRange } from "@/storage/fake/ranges";
import { sendSigned } from "./raw-request";
import { openStoreUnderTest, type StoreUnderTest } from "./store-under-test";
import vectors from "./vectors/ranges-rfc9110.json";

// Source: RFC 9110, sections 14.1 and 14.2 (vectors/ranges-rfc9110.json). S3 serves one range only; a request for
// several gets the whole body, which section 14.2 allows.
const cases = vectors.cases.map((row) => (row.parts && row.parts.length > 1 ? { ...row, status: 200, parts: null } : row));

test.each(cases)("$range of $length bytes: $status", ({ range, length, status, parts }) => {
  const [part] = parts ?? [];
  const expected = status === 416 ? "unsatisfiable" : part && { start: part[0], end: part[1] };
  expect(readRange(range, length)).toEqual(expected);
});

describe("as the store answers them", () => {
  let target: StoreUnderTest;
  const bytes = Buffer.from(Array.from({ length: 10_000 }, (_, index) => (index * 31) % 256));
  beforeAll(async () => {
    target = await openStoreUnderTest();
    await target.store.putObject("film", bytes, { contentType: "video/mp4" });
    await target.store.putObject("empty", "", { contentType: "video/mp4" });
  });
  afterAll(() => target.close());

  const get = (range: string, length = 10_000, headers = {}) =>
    sendSigned(target, { method: "GET", path: `/${target.bucket}/${length === 0 ? "empty" : "film"}`, headers: { range, ...headers } });

  test.each(cases)("$range of $length bytes: $status", async ({ range, length, status, parts, ...row }) => {
    const answer = await get(range, length);
    expect(answer.status).toBe(status);
    if ("contentRange" in row) expect(answer.headers["content-range"]).toBe(row.contentRange);
    if (status === 416) return expect(answer.code).toBe("InvalidRange");
    const [from, to] = parts?.[0] ?? [0, length - 1];
    expect(answer.body.equals(bytes.subarray(from, (to ?? 0) + 1))).toBe(true);
    expect(answer.headers["content-length"]).toBe(String(answer.body.length));
    expect(answer.headers["accept-ranges"]).toBe("bytes");
  });

  test("ranges one after the other join to the whole", async () => {
    const hash = createHash("sha256");
    for (let at = 0; at < bytes.length; at += 3333) hash.update((await get(`bytes=${at}-${at + 3332}`)).body);
    expect(hash.digest("hex")).toBe(createHash("sha256").update(bytes).digest("hex"));
  });

  // Source: RFC 9110, section 13.1.5: no strong match, whole body.
  test("If-Range sends the range while the object is the same, else the whole", async () => {
    const etag = `"${createHash("md5").update(bytes).digest("hex")}"`;
    expect((await get("bytes=0-9", 10_000, { "if-range": etag })).status).toBe(206);
    expect((await get("bytes=0-9", 10_000, { "if-range": '"other"' })).status).toBe(200);
    expect((await get("bytes=0-9", 10_000, { "if-range": `W/${etag}` })).status).toBe(200);
  });
});
