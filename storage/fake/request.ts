import type { IncomingMessage, ServerResponse } from "node:http";
import { Refusal } from "@/storage/fake/refusal";

/** A request as the store sees it: path-style address taken apart, query decoded, headers in lower case. */
export type StoreRequest = {
  method: string;
  /** Decoded, with its leading slash. */
  path: string;
  bucket: string;
  key: string;
  query: readonly (readonly [name: string, value: string])[];
  headers: Readonly<Record<string, string>>;
  incoming: IncomingMessage;
  response: ServerResponse;
};

/** What the pure parts of the store need of a request. */
export type RequestFacts = Pick<StoreRequest, "method" | "path" | "query" | "headers">;

const MAX_KEY_BYTES = 1024;

function decode(text: string): string {
  try {
    return decodeURIComponent(text);
  } catch {
    throw new Refusal("InvalidURI", "The address is not percent-encoded UTF-8.");
  }
}

/** Takes a raw request target apart. @throws Refusal InvalidURI, KeyTooLongError */
export function parseTarget(target: string): Pick<StoreRequest, "path" | "bucket" | "key" | "query"> {
  const mark = target.indexOf("?");
  const path = decode(mark < 0 ? target : target.slice(0, mark));
  const query = (mark < 0 ? "" : target.slice(mark + 1))
    .split("&")
    .filter((pair) => pair !== "")
    .map((pair) => {
      const equals = pair.indexOf("=");
      const [name, value] = equals < 0 ? [pair, ""] : [pair.slice(0, equals), pair.slice(equals + 1)];
      return [decode(name.replaceAll("+", " ")), decode(value.replaceAll("+", " "))] as const;
    });
  const slash = path.indexOf("/", 1);
  const key = slash < 0 ? "" : path.slice(slash + 1);
  if (Buffer.byteLength(key) > MAX_KEY_BYTES) throw new Refusal("KeyTooLongError", "A key has at most 1024 bytes.");
  return { path, bucket: path.slice(1, slash < 0 ? undefined : slash), key, query };
}

/** Wraps what node:http hands over. @throws Refusal InvalidURI, KeyTooLongError */
export function toStoreRequest(incoming: IncomingMessage, response: ServerResponse): StoreRequest {
  const headers = Object.fromEntries(
    Object.entries(incoming.headers).map(([name, value]) => [name, Array.isArray(value) ? value.join(",") : (value ?? "")]),
  );
  return { method: incoming.method ?? "GET", ...parseTarget(incoming.url ?? "/"), headers, incoming, response };
}

/** The first value of a query parameter; undefined when it is not there at all. */
export const param = (request: Pick<StoreRequest, "query">, name: string): string | undefined =>
  request.query.find(([each]) => each === name)?.[1];

/** An `x-amz-…` value: presigning moves such headers into the query, so look in both. */
export const amzHeader = (request: Pick<StoreRequest, "query" | "headers">, name: string): string | undefined =>
  request.headers[name] ?? request.query.find(([each]) => each.toLowerCase() === name)?.[1];

/** A whole number parameter within limits, or `otherwise` when absent. @throws Refusal InvalidArgument */
export function numberParam(request: Pick<StoreRequest, "query">, name: string, otherwise: number, min: number, max: number): number {
  const text = param(request, name);
  if (text === undefined) return otherwise;
  const value = /^\d{1,9}$/.test(text) ? Number(text) : Number.NaN;
  if (!(value >= min && value <= max)) throw new Refusal("InvalidArgument", `${name} must be a whole number from ${min} to ${max}.`);
  return value;
}
