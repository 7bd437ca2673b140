import { ListObjectsV2Command, PutObjectCommand, paginateListObjectsV2 } from "@aws-sdk/client-s3";
import fc from "fast-check";
import { afterAll, beforeAll, expect, test } from "vitest";
import { listPage } from "@/storage/fake/listing";
import { sendSigned } from "./raw-request";
import { openStoreUnderTest, type StoreUnderTest } from "./store-under-test";

// The example of the S3 user guide, "Organizing objects using prefixes" (sample.jpg and photos by year), and keys whose
// order by UTF-8 bytes differs from that by UTF-16 units (U+FF5E before U+1F527).
const KEYS = [
  "photos/2006/February/sample2.jpg", "photos/2006/February/sample3.jpg", "photos/2006/January/sample.jpg", "photos/2006/index", "sample.jpg",
  "z/\uff5e", "z/\u{1f527}", "z/a b&<c>",
];

let target: StoreUnderTest;
beforeAll(async () => {
  target = await openStoreUnderTest();
  for (const Key of [...KEYS].reverse()) await target.client.send(new PutObjectCommand({ Bucket: target.bucket, Key, Body: Key }));
});
afterAll(() => target.close());

const list = async (more = {}) => {
  const page = await target.client.send(new ListObjectsV2Command({ Bucket: target.bucket, ...more }));
  return { page, keys: (page.Contents ?? []).map(({ Key }) => Key), prefixes: (page.CommonPrefixes ?? []).map(({ Prefix }) => Prefix) };
};

test("lists all keys in the order of their bytes, with size and ETag", async () => {
  const { page, keys } = await list();
  expect(keys).toEqual(["photos/2006/February/sample2.jpg", "photos/2006/February/sample3.jpg", "photos/2006/January/sample.jpg",
    "photos/2006/index", "sample.jpg", "z/a b&<c>", "z/\uff5e", "z/\u{1f527}"]);
  expect(page).toMatchObject({ KeyCount: 8, IsTruncated: false });
  expect(page.Contents?.[4]).toMatchObject({ Size: 10, ETag: expect.stringMatching(/^"[0-9a-f]{32}"$/) });
});

// Source: Amazon S3 user guide, "Organizing objects using prefixes": delimiter "/" gives sample.jpg and photos/.
test("a delimiter folds what lies below", async () => {
  expect(await list({ Delimiter: "/" })).toMatchObject({ keys: ["sample.jpg"], prefixes: ["photos/", "z/"] });
  expect(await list({ Delimiter: "/", Prefix: "photos/2006/" })).toMatchObject({
    keys: ["photos/2006/index"], prefixes: ["photos/2006/February/", "photos/2006/January/"],
  });
});

test("a prefix and a start cut the list", async () => {
  expect((await list({ Prefix: "photos/2006/F" })).keys).toHaveLength(2);
  expect((await list({ Prefix: "nothing" })).keys).toEqual([]);
  expect((await list({ StartAfter: "sample.jpg" })).keys).toEqual(["z/a b&<c>", "z/\uff5e", "z/\u{1f527}"]);
});

test.each([1, 2, 3])("pages of %i join to the whole, folded or not", async (MaxKeys) => {
  for (const Delimiter of [undefined, "/"]) {
    const whole = await list({ Delimiter });
    const found: (string | undefined)[] = [];
    for await (const page of paginateListObjectsV2({ client: target.client }, { Bucket: target.bucket, Delimiter, MaxKeys })) {
      expect((page.Contents?.length ?? 0) + (page.CommonPrefixes?.length ?? 0)).toBeLessThanOrEqual(MaxKeys);
      found.push(...(page.Contents ?? []).map(({ Key }) => Key), ...(page.CommonPrefixes ?? []).map(({ Prefix }) => Prefix));
    }
    expect([...found].sort()).toEqual([...whole.keys, ...whole.prefixes].sort());
  }
});

test("encodes keys if asked, and refuses a made-up continuation", async () => {
  const { page } = await list({ EncodingType: "url", Prefix: "z/a" });
  expect(page.Contents?.[0]?.Key).toBe("z/a%20b%26%3Cc%3E");
  const query = "continuation-token=bWFkZSB1cA&list-type=2";
  expect((await sendSigned(target, { method: "GET", path: `/${target.bucket}`, query })).code).toBe("InvalidArgument");
});

test("no key is lost or comes twice, whatever the keys, prefix, delimiter and page", () => {
  const key = fc.array(fc.constantFrom("a", "b", "/", "ü"), { minLength: 1, maxLength: 6 }).map((letters) => letters.join(""));
  const byBytes = (a: string, b: string) => Buffer.compare(Buffer.from(a), Buffer.from(b));
  fc.assert(
    fc.property(fc.uniqueArray(key, { maxLength: 25 }), fc.constantFrom("", "a", "a/"), fc.constantFrom("", "/"), fc.integer({ min: 1, max: 4 }),
      (keys, prefix, delimiter, max) => {
        const sorted = [...keys].sort(byBytes);
        const matching = sorted.filter((each) => each.startsWith(prefix));
        const foldedOf = (each: string) => {
          const end = delimiter === "" ? -1 : each.indexOf(delimiter, prefix.length);
          return end < 0 ? each : each.slice(0, end + 1);
        };
        const expected = [...new Set(matching.map(foldedOf))].sort();
        const found: string[] = [];
        let after = "";
        for (let pages = 0; pages < 40; pages += 1) {
          const page = listPage(sorted, { prefix, delimiter, after, max });
          found.push(...page.keys, ...page.prefixes);
          if (!page.isTruncated) break;
          after = page.last;
        }
        expect(found.sort()).toEqual(expected);
      }),
  );
});
