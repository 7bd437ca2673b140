import { createHash, createHmac } from "node:crypto";

/** The parts of a request that its signature covers. `path` is decoded; `query` leaves out X-Amz-Signature. */
export type SignedParts = {
  method: string;
  path: string;
  query: readonly (readonly [name: string, value: string])[];
  headers: Readonly<Record<string, string>>;
  signedHeaders: readonly string[];
  payloadHash: string;
};

/** The scope of a signing key, as in `20130524/us-east-1/s3/aws4_request`. */
export type Scope = { day: string; region: string; service: string };

export const ALGORITHM = "AWS4-HMAC-SHA256";
export const UNSIGNED_PAYLOAD = "UNSIGNED-PAYLOAD";
export const EMPTY_SHA256 = "e3b0c44298fc1c149afbf4c8996fb92427ae41e4649b934ca495991b7852b855";

export const sha256Hex = (data: string | Buffer): string => createHash("sha256").update(data).digest("hex");
const hmac = (key: string | Buffer, text: string): Buffer => createHmac("sha256", key).update(text).digest();

/** Percent-encodes all but the unreserved characters of RFC 3986, in capitals; S3 keeps the slashes of a path. */
export function uriEncode(text: string, keepSlashes: boolean): string {
  const encoded = encodeURIComponent(text).replace(/[!'()*]/g, (c) => `%${c.charCodeAt(0).toString(16).toUpperCase()}`);
  return keepSlashes ? encoded.replaceAll("%2F", "/") : encoded;
}

/** @source Amazon S3 API reference, "Signature calculations for the authorization header", task 1. */
export function canonicalRequest(parts: SignedParts): string {
  const query = parts.query
    .map(([name, value]) => [uriEncode(name, false), uriEncode(value, false)] as const)
    .sort(([a, x], [b, y]) => (a === b ? Number(x > y) - Number(x < y) : a > b ? 1 : -1))
    .map(([name, value]) => `${name}=${value}`);
  const headers = parts.signedHeaders.map((name) => `${name}:${(parts.headers[name] ?? "").trim().replace(/ +/g, " ")}\n`);
  return [
    parts.method,
    uriEncode(parts.path, true),
    query.join("&"),
    headers.join(""),
    parts.signedHeaders.join(";"),
    parts.payloadHash,
  ].join("\n");
}

export const scopeText = (scope: Scope): string => `${scope.day}/${scope.region}/${scope.service}/aws4_request`;

/** Task 2 of the same source. `date` is `yyyymmddThhmmssZ`. */
export const stringToSign = (date: string, scope: Scope, canonical: string): string =>
  [ALGORITHM, date, scopeText(scope), sha256Hex(canonical)].join("\n");

/** Task 3 of the same source: the day's key for one region and service. */
export function signingKey(secretAccessKey: string, scope: Scope): Buffer {
  const day = hmac(`AWS4${secretAccessKey}`, scope.day);
  return hmac(hmac(hmac(day, scope.region), scope.service), "aws4_request");
}

export const signText = (key: Buffer, text: string): string => hmac(key, text).toString("hex");

/** `yyyymmddThhmmssZ` to milliseconds, or undefined for any other shape. */
export function parseAmzDate(text: string): number | undefined {
  const match = /^(\d{4})(\d\d)(\d\d)T(\d\d)(\d\d)(\d\d)Z$/.exec(text);
  if (!match) return undefined;
  const [, year, month, day, hour, minute, second] = match;
  const ms = Date.parse(`${year}-${month}-${day}T${hour}:${minute}:${second}Z`);
  return Number.isNaN(ms) ? undefined : ms;
}

export const formatAmzDate = (ms: number): string => new Date(ms).toISOString().replace(/[-:]|\.\d{3}/g, "");
