import { describe, expect, test } from "vitest";
import type { Authorised } from "@/storage/fake/authorise";
import { decodeChunked } from "@/storage/fake/chunked";
import { Refusal } from "@/storage/fake/refusal";
import { signingKey } from "@/storage/fake/signature";
import vectors from "./vectors/sigv4.json";

const scope = { day: "20130524", region: "us-east-1", service: "s3" };
const authOf = (signature: string): Authorised => ({
  signature, scope, date: vectors.date, payloadHash: "", key: signingKey(vectors.secretAccessKey, scope),
});

async function decode(text: string, signature: string, signed: boolean, step: number): Promise<{ text: string; trailers: Record<string, string> } | string> {
  const bytes = Buffer.from(text);
  async function* source() {
    for (let at = 0; at < bytes.length; at += step) yield bytes.subarray(at, at + step);
  }
  let trailers: Record<string, string> = {};
  const chunks: Buffer[] = [];
  try {
    for await (const chunk of decodeChunked(source(), authOf(signature), signed, (sent) => { trailers = sent; })) chunks.push(chunk);
  } catch (error) {
    return error instanceof Refusal ? error.code : String(error);
  }
  return { text: Buffer.concat(chunks).toString(), trailers };
}

// Source: Amazon S3 API reference, "Transferring payload in multiple chunks": 65 KiB of "a" in chunks of 64 and 1 KiB.
// Signatures as quoted in public test suites; the seed was recomputed from the request's headers.
const SEED = "4f232c4386841ef735655705268965c44a0e4690baa4adea153f7db9fa80a0a9";
const BODY = [
  "10000;chunk-signature=ad80c730a21e5b8d04586a2213dd63b9a0e99e0e2307b0ade35a65485a288648", "a".repeat(65_536),
  "400;chunk-signature=0055627c9e194cb4542bae2aa5492e3c1575bbb81b612b7d234b86a503ef5497", "a".repeat(1024),
  "0;chunk-signature=b6c6ea8a5354eaf15b3cb7646744f4275b71ea724fed81ceb9323e279d449df9", "", "",
].join("\r\n");

// Source: same reference, "Signature calculations for trailing headers": the same bytes with a CRC32C behind them.
const TRAILER_SEED = "106e2a8a18243abcf37539882f36619c00e2dfc72633413f02d3b74544bfeb8e";
const TRAILER_BODY = [
  "10000;chunk-signature=b474d8862b1487a5145d686f57f013e54db672cee1c953b3010fb58501ef5aa2", "a".repeat(65_536),
  "400;chunk-signature=1c1344b170168f8e65b41376b44b20fe354e373826ccbbe2c1d40a8cae51e5c7", "a".repeat(1024),
  "0;chunk-signature=2ca2aba2005185cf7159c6277faf83795951dd77a3a99e6e65d5c9f85863f992",
  "x-amz-checksum-crc32c:sOO8/Q==",
  "x-amz-trailer-signature:d81f82fc3505edab99d459891051a732e8730629a2e4a59689829ca17fe2e435", "", "",
].join("\r\n");

describe.each([7, 1000, 100_000])("in pieces of %i bytes", (step) => {
  test("the published chunked body decodes", async () => {
    expect(await decode(BODY, SEED, true, step)).toEqual({ text: "a".repeat(66_560), trailers: {} });
  });

  test("the published body with trailers decodes", async () => {
    expect(await decode(TRAILER_BODY, TRAILER_SEED, true, step)).toEqual({
      text: "a".repeat(66_560), trailers: { "x-amz-checksum-crc32c": "sOO8/Q==" },
    });
  });

  test("an unsigned body with a trailer decodes", async () => {
    const body = "5\r\nhello\r\n6\r\n world\r\n0\r\nx-amz-checksum-crc32:DUoRhQ==\r\n\r\n";
    expect(await decode(body, "", false, step)).toEqual({ text: "hello world", trailers: { "x-amz-checksum-crc32": "DUoRhQ==" } });
  });
});

test.each([
  ["a changed byte", BODY.replace("aaaa", "aaab"), "SignatureDoesNotMatch"],
  ["a changed seed", BODY.replace("ad80c7", "ad80c8"), "SignatureDoesNotMatch"],
  ["a lost last chunk", BODY.slice(0, BODY.indexOf("\r\n0;") + 2), "InvalidRequest"],
  ["a body cut in a chunk", BODY.slice(0, 30_000), "IncompleteBody"],
  ["a chunk longer than it says", BODY.replace("\r\n400;", "\r\n3ff;"), "SignatureDoesNotMatch"],
  ["no signature", BODY.replace(/;chunk-signature=\w+/, ""), "SignatureDoesNotMatch"],
])("refuses %s", async (_, body, code) => {
  expect(await decode(body, SEED, true, 4096)).toBe(code);
});

test("refuses a changed trailer", async () => {
  expect(await decode(TRAILER_BODY.replace("sOO8", "sOO9"), TRAILER_SEED, true, 4096)).toBe("SignatureDoesNotMatch");
});

test("refuses an unsigned chunk that is longer than it says, and one without a size", async () => {
  expect(await decode("4\r\nhello\r\n0\r\n\r\n", "", false, 100)).toBe("InvalidRequest");
  expect(await decode("hello", "", false, 100)).toBe("IncompleteBody");
});
