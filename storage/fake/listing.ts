import type { Bucket } from "@/storage/fake/bucket";
import { Refusal } from "@/storage/fake/refusal";
import { numberParam, param, type StoreRequest } from "@/storage/fake/request";
import { isoTime, type Reply } from "@/storage/fake/reply";
import { uriEncode } from "@/storage/fake/signature";

const PAGE = 1000;

const compareKeys = (a: string, b: string) => Buffer.compare(Buffer.from(a), Buffer.from(b));

/** Where in the sorted keys the first one stands that comes after `key`. */
function indexAfter(keys: readonly string[], key: string): number {
  let [low, high] = [0, keys.length];
  while (low < high) {
    const middle = (low + high) >> 1;
    if (compareKeys(keys[middle] ?? "", key) <= 0) low = middle + 1;
    else high = middle;
  }
  return low;
}

/** One page of a list: keys, and the prefixes that stand for all keys under them up to the delimiter. */
export type ListPage = { keys: string[]; prefixes: string[]; last: string; isTruncated: boolean };

/**
 * Cuts one page out of sorted keys.
 * @param after a key or a common prefix that the page before ended with; nothing of it comes again.
 * @source Amazon S3 API reference, ListObjectsV2.
 */
export function listPage(all: readonly string[], options: { prefix: string; delimiter: string; after: string; max: number }): ListPage {
  const { prefix, delimiter, after, max } = options;
  const page: ListPage = { keys: [], prefixes: [], last: after, isTruncated: false };
  const skipped = delimiter !== "" && after.endsWith(delimiter) ? after : undefined;
  const start = Math.max(indexAfter(all, after), prefix === "" ? 0 : indexAfter(all, prefix) - 1);
  for (const key of all.slice(start)) {
    if (!key.startsWith(prefix)) {
      if (compareKeys(key, prefix) > 0) break;
      continue;
    }
    const end = delimiter === "" ? -1 : key.indexOf(delimiter, prefix.length);
    const common = end < 0 ? undefined : key.slice(0, end + delimiter.length);
    if (common !== undefined && (common === skipped || common === page.prefixes.at(-1))) continue;
    if (page.keys.length + page.prefixes.length === max) return { ...page, isTruncated: max > 0 };
    if (common === undefined) page.keys.push(key);
    else page.prefixes.push(common);
    page.last = common ?? key;
  }
  return page;
}

function readToken(token: string): string {
  const text = Buffer.from(token, "base64url").toString("utf8");
  if (!text.startsWith("after:")) throw new Refusal("InvalidArgument", "The continuation token provided is incorrect");
  return text.slice(6);
}
const writeToken = (last: string) => Buffer.from(`after:${last}`).toString("base64url");

export function listObjects(bucket: Bucket, request: StoreRequest): Reply {
  if (param(request, "list-type") !== "2") throw new Refusal("NotImplemented", "Only version 2 of ListObjects is served.");
  const prefix = param(request, "prefix") ?? "";
  const delimiter = param(request, "delimiter") ?? "";
  const token = param(request, "continuation-token");
  const startAfter = param(request, "start-after");
  const max = numberParam(request, "max-keys", PAGE, 0, 999_999_999);
  const after = token === undefined ? (startAfter ?? "") : readToken(token);
  const page = listPage(bucket.keys(), { prefix, delimiter, after, max: Math.min(max, PAGE) });
  const encoding = param(request, "encoding-type");
  const write = (key: string) => (encoding === "url" ? uriEncode(key, true) : key);

  const contents = page.keys.flatMap((key) => {
    const record = bucket.find(key);
    if (!record) return [];
    const { etag, sizeBytes, modifiedMs } = record;
    return [{ Key: write(key), LastModified: isoTime(modifiedMs), ETag: `"${etag}"`, Size: sizeBytes, StorageClass: "STANDARD" }];
  });
  const content = {
    Name: request.bucket,
    Prefix: write(prefix),
    Delimiter: delimiter === "" ? undefined : write(delimiter),
    StartAfter: startAfter === undefined ? undefined : write(startAfter),
    EncodingType: encoding,
    MaxKeys: max,
    KeyCount: page.keys.length + page.prefixes.length,
    IsTruncated: page.isTruncated,
    ContinuationToken: token,
    NextContinuationToken: page.isTruncated ? writeToken(page.last) : undefined,
    Contents: contents,
    CommonPrefixes: page.prefixes.map((common) => ({ Prefix: write(common) })),
  };
  return { status: 200, xml: { name: "ListBucketResult", content } };
}
