import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { sendRaw } from "./raw-request";
import { isOwnStore, openStoreUnderTest, PAGE_ORIGIN, type StoreUnderTest } from "./store-under-test";

// Source: Fetch standard, "CORS protocol". Which origins may come in is a setting, so only our own store is asked.
describe.runIf(isOwnStore)("pages of an allowed origin", () => {
  let target: StoreUnderTest;
  let url: string;
  beforeAll(async () => {
    target = await openStoreUnderTest();
    await target.store.putObject("film", "0123456789", { contentType: "video/mp4" });
    url = await target.store.presignGet("film", 600);
  });
  afterAll(() => target.close());

  const preflight = (origin: string, method: string) =>
    sendRaw(`${target.endpoint}/${target.bucket}/film?partNumber=1`, {
      method: "OPTIONS",
      headers: { origin, "access-control-request-method": method, "access-control-request-headers": "content-type,x-amz-checksum-sha256" },
    });

  test("may PUT, with the headers that they ask for", async () => {
    const { status, headers } = await preflight(PAGE_ORIGIN, "PUT");
    expect(status).toBe(200);
    expect(headers["access-control-allow-origin"]).toBe(PAGE_ORIGIN);
    expect(headers["access-control-allow-methods"]).toContain("PUT");
    expect(headers["access-control-allow-headers"]).toBe("content-type,x-amz-checksum-sha256");
    expect(headers.vary).toContain("Origin");
  });

  test("may read the ETag and the range of an answer", async () => {
    const { status, headers } = await sendRaw(url, { method: "GET", headers: { origin: PAGE_ORIGIN, range: "bytes=0-3" } });
    expect(status).toBe(206);
    expect(headers["access-control-allow-origin"]).toBe(PAGE_ORIGIN);
    expect(headers["access-control-expose-headers"]).toMatch(/ETag.*Content-Range/);
  });

  test("are told why they were refused", async () => {
    const { status, headers } = await sendRaw(`${target.endpoint}/${target.bucket}/film`, { method: "PUT", headers: { origin: PAGE_ORIGIN }, body: "x" });
    expect(status).toBe(403);
    expect(headers["access-control-allow-origin"]).toBe(PAGE_ORIGIN);
  });

  test("others may not", async () => {
    expect(await preflight("http://elsewhere.example", "PUT")).toMatchObject({ status: 403, code: "AccessForbidden" });
    expect((await preflight(PAGE_ORIGIN, "PATCH")).status).toBe(403);
    const { headers } = await sendRaw(url, { method: "GET", headers: { origin: "http://elsewhere.example" } });
    expect(headers["access-control-allow-origin"]).toBeUndefined();
    expect(headers.vary).toContain("Origin");
  });
});
