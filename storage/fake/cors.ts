import { Refusal } from "@/storage/fake/refusal";
import type { StoreRequest } from "@/storage/fake/request";

const METHODS = ["GET", "PUT", "HEAD", "POST", "DELETE"];
const EXPOSED = [
  "ETag", "Content-Length", "Content-Range", "Accept-Ranges", "x-amz-request-id",
  "x-amz-checksum-crc32", "x-amz-checksum-crc32c", "x-amz-checksum-crc64nvme", "x-amz-checksum-sha256",
];

const isAllowed = (origin: string, origins: readonly string[]) => origins.includes(origin) || origins.includes("*");

/** What a page of an allowed origin needs to read an answer, its ETag above all. Nothing for other origins. */
export function corsHeaders(headers: StoreRequest["headers"], origins: readonly string[]): Record<string, string> {
  const { origin } = headers;
  if (origin === undefined || !isAllowed(origin, origins)) return { vary: "Origin" };
  return { "access-control-allow-origin": origin, "access-control-expose-headers": EXPOSED.join(", "), vary: "Origin" };
}

/** The answer to a preflight; it carries no signature. @throws Refusal AccessForbidden, InvalidRequest @source Fetch standard, "CORS protocol". */
export function preflightHeaders(headers: StoreRequest["headers"], origins: readonly string[]): Record<string, string> {
  const { origin, "access-control-request-method": method, "access-control-request-headers": asked } = headers;
  if (origin === undefined || method === undefined) {
    throw new Refusal("InvalidRequest", "A preflight needs the headers Origin and Access-Control-Request-Method.");
  }
  if (!isAllowed(origin, origins) || !METHODS.includes(method)) {
    throw new Refusal("AccessForbidden", "CORSResponse: This CORS request is not allowed.");
  }
  return {
    ...corsHeaders(headers, origins),
    "access-control-allow-methods": METHODS.join(", "),
    ...(asked === undefined ? {} : { "access-control-allow-headers": asked }),
    "access-control-max-age": "3000",
    vary: "Origin, Access-Control-Request-Headers, Access-Control-Request-Method",
  };
}
