import { createHash } from "node:crypto";
import type { Authorised } from "@/storage/fake/authorise";
import { receiveBody, receiveText } from "@/storage/fake/body";
import { keyTurn, type Bucket } from "@/storage/fake/bucket";
import { checksumElementName, checksumHeaderName, type Checksum } from "@/storage/fake/checksums";
import { checkReadConditions, checkWriteConditions, rangeStillApplies } from "@/storage/fake/conditions";
import { readRange } from "@/storage/fake/ranges";
import type { ObjectRecord } from "@/storage/fake/records";
import { Refusal } from "@/storage/fake/refusal";
import { amzHeader, param, parseTarget, type StoreRequest } from "@/storage/fake/request";
import { isoTime, type Reply } from "@/storage/fake/reply";
import type { Store } from "@/storage/fake/store";
import { childText, readXml } from "@/storage/fake/xml";

const KEPT = ["content-type", "cache-control", "content-disposition", "content-encoding", "content-language", "expires"];
const SENDABLE = /^[\t\x20-\x7e\x80-\xff]*$/;
const MAX_DELETED = 1000;

/** The headers of a PUT that come back with the object. */
export function keptHeaders(request: StoreRequest): Record<string, string> {
  const kept: Record<string, string> = { "content-type": "binary/octet-stream" };
  for (const [name, value] of Object.entries(request.headers)) {
    if (KEPT.includes(name) || name.startsWith("x-amz-meta-")) kept[name] = value;
  }
  for (const [name, value] of request.query) {
    if (name.toLowerCase().startsWith("x-amz-meta-")) kept[name.toLowerCase()] = value;
  }
  // `aws-chunked` was only how the body travelled.
  const encoding = kept["content-encoding"]?.split(",").map((each) => each.trim()).filter((each) => each !== "aws-chunked");
  delete kept["content-encoding"];
  return encoding?.length ? { ...kept, "content-encoding": encoding.join(",") } : kept;
}

export const checksumHeaders = (checksum: Checksum | undefined): Record<string, string> =>
  checksum ? { [checksumHeaderName(checksum.algorithm)]: checksum.value, "x-amz-checksum-type": checksum.type } : {};

/** Writes the bytes, then makes them the object of that key, both or neither. */
async function storeObject(bucket: Bucket, request: StoreRequest, chunks: AsyncIterable<Buffer>, describe: () => Pick<ObjectRecord, "etag" | "headers" | "checksum">) {
  const piece = await bucket.data.write(chunks);
  try {
    return await bucket.inTurn(keyTurn(request.key), async () => {
      checkWriteConditions(request.headers, bucket.find(request.key));
      const pieces = piece.sizeBytes === 0 ? [] : [piece];
      const record = { key: request.key, sizeBytes: piece.sizeBytes, modifiedMs: Date.now(), pieces, ...describe() };
      await bucket.put(record);
      if (pieces.length === 0) await bucket.data.remove([piece.file]);
      return record;
    });
  } catch (error) {
    await bucket.data.remove([piece.file]);
    throw error;
  }
}

export async function putObject(bucket: Bucket, request: StoreRequest, auth: Authorised): Promise<Reply> {
  const body = receiveBody(request, auth);
  const headers = keptHeaders(request);
  const record = await storeObject(bucket, request, body.chunks, () => ({ etag: body.md5(), headers, checksum: body.checksum() }));
  return { status: 200, headers: { etag: `"${record.etag}"`, ...checksumHeaders(record.checksum) } };
}

/** Copies by reading and writing, so that the copy has an ETag and pieces of its own. */
export async function copyObject(store: Store, bucket: Bucket, request: StoreRequest): Promise<Reply> {
  const source = parseTarget(`/${(amzHeader(request, "x-amz-copy-source") ?? "").replace(/^\//, "")}`);
  const from = store.bucket(source.bucket);
  const original = from.find(source.key);
  if (!original) throw new Refusal("NoSuchKey", "The specified key does not exist.");
  const replaces = amzHeader(request, "x-amz-metadata-directive") === "REPLACE";
  if (original.key === request.key && from === bucket && !replaces) {
    throw new Refusal("InvalidRequest", "This copy request is illegal because it copies an object to itself without changing its metadata.");
  }
  const md5 = createHash("md5");
  async function* bytes(record: ObjectRecord) {
    for await (const chunk of from.data.read(record.pieces, 0, record.sizeBytes - 1)) {
      md5.update(chunk);
      yield chunk;
    }
  }
  const headers = replaces ? keptHeaders(request) : original.headers;
  const record = await storeObject(bucket, request, bytes(original), () => ({ etag: md5.digest("hex"), headers }));
  const content = { LastModified: isoTime(record.modifiedMs), ETag: `"${record.etag}"` };
  return { status: 200, xml: { name: "CopyObjectResult", content } };
}

function overrides(request: StoreRequest): Record<string, string> {
  const found: Record<string, string> = {};
  for (const name of KEPT) {
    const value = param(request, `response-${name}`);
    if (value === undefined) continue;
    if (!SENDABLE.test(value)) throw new Refusal("InvalidArgument", `response-${name} holds characters that no header may hold.`);
    found[name] = value;
  }
  return found;
}

/** Answers GET and HEAD. */
export function getObject(bucket: Bucket, request: StoreRequest): Reply {
  const record = bucket.find(request.key);
  if (!record) throw new Refusal("NoSuchKey", "The specified key does not exist.", { details: { Key: request.key } });
  checkReadConditions(request.headers, record);
  const { sizeBytes, pieces } = record;
  const asked = request.headers["range"];
  const range = asked !== undefined && rangeStillApplies(request.headers, record) ? readRange(asked, sizeBytes) : undefined;
  if (range === "unsatisfiable") {
    throw new Refusal("InvalidRange", "The requested range is not satisfiable", { headers: { "content-range": `bytes */${sizeBytes}` } });
  }
  const headers = {
    ...record.headers,
    ...overrides(request),
    etag: `"${record.etag}"`,
    "last-modified": new Date(record.modifiedMs).toUTCString(),
    "accept-ranges": "bytes",
    ...(amzHeader(request, "x-amz-checksum-mode") === "ENABLED" && !range ? checksumHeaders(record.checksum) : {}),
  };
  const { start, end } = range ?? { start: 0, end: sizeBytes - 1 };
  const contentRange = range ? { "content-range": `bytes ${start}-${end}/${sizeBytes}` } : {};
  return {
    status: range ? 206 : 200,
    headers: { ...headers, ...contentRange, "content-length": end - start + 1 },
    ...(request.method === "HEAD" ? {} : { body: bucket.data.read(pieces, start, end) }),
  };
}

export async function deleteObject(bucket: Bucket, key: string): Promise<Reply> {
  await bucket.inTurn(keyTurn(key), () => bucket.delete(key));
  return { status: 204 };
}

/** Deletes up to a thousand keys. S3 insists on a digest here, since a damaged list would delete the wrong things. */
export async function deleteObjects(bucket: Bucket, request: StoreRequest, auth: Authorised): Promise<Reply> {
  const digest = ["content-md5", "x-amz-trailer"].some((name) => request.headers[name] !== undefined)
    || Object.keys(request.headers).some((name) => name.startsWith("x-amz-checksum-"));
  if (!digest) throw new Refusal("InvalidRequest", "Missing required header for this request: Content-MD5 OR x-amz-checksum-*");
  const document = readXml(await receiveText(request, auth, 4 * 1024 * 1024));
  const keys = document.children.filter((child) => child.name === "Object").map((child) => childText(child, "Key") ?? "");
  if (document.name !== "Delete" || keys.length === 0 || keys.length > MAX_DELETED || keys.includes("")) {
    throw new Refusal("MalformedXML", "The list must name 1 to 1000 keys.");
  }
  for (const key of keys) await deleteObject(bucket, key);
  const quiet = childText(document, "Quiet") === "true";
  return { status: 200, xml: { name: "DeleteResult", content: { Deleted: quiet ? [] : keys.map((Key) => ({ Key })) } } };
}

/** How a checksum is named inside a document. */
export const checksumElements = (checksum: Checksum | undefined): Record<string, string> =>
  checksum ? { [checksumElementName(checksum.algorithm)]: checksum.value, ChecksumType: checksum.type } : {};
