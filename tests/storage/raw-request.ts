import { createHash, createHmac } from "node:crypto";
import { request as httpRequest } from "node:http";
import { request as httpsRequest } from "node:https";
import type { StoreUnderTest } from "./store-under-test";

export type RawAnswer = { status: number; headers: Record<string, string>; body: Buffer; text: string; code: string | undefined };

/** Sends a request exactly as given. `code` is the S3 error code of the answer, if it holds one. */
export function sendRaw(url: string, options: { method: string; headers?: Record<string, string>; body?: Buffer | string }): Promise<RawAnswer> {
  const send = url.startsWith("https:") ? httpsRequest : httpRequest;
  return new Promise((resolve, reject) => {
    const outgoing = send(url, { method: options.method, headers: options.headers ?? {}, agent: false }, (incoming) => {
      const chunks: Buffer[] = [];
      incoming.on("data", (chunk: Buffer) => chunks.push(chunk));
      incoming.on("error", reject);
      incoming.on("end", () => {
        const body = Buffer.concat(chunks);
        const text = body.toString("utf8");
        const headers = Object.fromEntries(Object.entries(incoming.headers).map(([name, value]) => [name, String(value)]));
        resolve({ status: incoming.statusCode ?? 0, headers, body, text, code: /<Code>(\w+)<\/Code>/.exec(text)?.[1] });
      });
    });
    outgoing.on("error", reject);
    outgoing.end(options.body);
  });
}

const hmac = (key: string | Buffer, text: string) => createHmac("sha256", key).update(text).digest();
const sha256 = (data: string | Buffer) => createHash("sha256").update(data).digest("hex");

/**
 * Signs in the header, after the S3 documentation and not with the store's own code. `path` and `query` are taken as
 * already encoded; the names in `query` must be sorted.
 */
export function signHeaders(
  target: Pick<StoreUnderTest, "endpoint" | "region" | "credentials">,
  request: { method: string; path: string; query?: string; headers?: Record<string, string>; body?: Buffer | string; payloadHash?: string; date?: Date },
): Record<string, string> {
  const date = (request.date ?? new Date()).toISOString().replace(/[-:]|\.\d{3}/g, "");
  const scope = `${date.slice(0, 8)}/${target.region}/s3/aws4_request`;
  const payloadHash = request.payloadHash ?? sha256(request.body ?? "");
  const headers: Record<string, string> = {
    ...request.headers, host: new URL(target.endpoint).host, "x-amz-content-sha256": payloadHash, "x-amz-date": date,
  };
  const names = Object.keys(headers).sort();
  const lines = names.map((name) => `${name}:${headers[name]}\n`).join("");
  const canonical = [request.method, request.path, request.query ?? "", lines, names.join(";"), payloadHash].join("\n");
  const key = scope.split("/").reduce<string | Buffer>((previous, part) => hmac(previous, part), `AWS4${target.credentials.secretAccessKey}`);
  const signature = hmac(key, ["AWS4-HMAC-SHA256", date, scope, sha256(canonical)].join("\n")).toString("hex");
  const credential = `${target.credentials.accessKeyId}/${scope}`;
  return { ...headers, authorization: `AWS4-HMAC-SHA256 Credential=${credential},SignedHeaders=${names.join(";")},Signature=${signature}` };
}

/** Signs and sends. */
export function sendSigned(
  target: Pick<StoreUnderTest, "endpoint" | "region" | "credentials">,
  request: Parameters<typeof signHeaders>[1],
): Promise<RawAnswer> {
  const url = `${target.endpoint}${request.path}${request.query ? `?${request.query}` : ""}`;
  const length: Record<string, string> = request.body === undefined ? {} : { "content-length": String(Buffer.byteLength(request.body)) };
  return sendRaw(url, {
    method: request.method, headers: { ...length, ...signHeaders(target, request) }, ...(request.body === undefined ? {} : { body: request.body }),
  });
}
