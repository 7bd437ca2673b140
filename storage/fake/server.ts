import { randomUUID } from "node:crypto";
import { createServer, type IncomingMessage, type ServerResponse } from "node:http";
import type { AddressInfo } from "node:net";
import { authorise, type Authorised, type Credentials } from "@/storage/fake/authorise";
import { corsHeaders, preflightHeaders } from "@/storage/fake/cors";
import { listObjects } from "@/storage/fake/listing";
import { abortUpload, completeUpload, listParts, listUploads, putPart, startUpload } from "@/storage/fake/multipart-requests";
import { copyObject, deleteObject, deleteObjects, getObject, putObject } from "@/storage/fake/object-requests";
import { Refusal } from "@/storage/fake/refusal";
import { amzHeader, param, toStoreRequest, type StoreRequest } from "@/storage/fake/request";
import { sendReply, type Reply } from "@/storage/fake/reply";
import { Store } from "@/storage/fake/store";

export type FakeStoreOptions = Credentials & {
  /** Where objects are kept; made if it isn't there. One process at a time. */
  directory: string;
  /** 0 takes any free port. */
  port: number;
  host: string;
  /** Origins whose pages may read and write, as `http://localhost:3000`; "*" allows all. */
  corsOrigins: readonly string[];
};

export type FakeStore = { url: string; close(): Promise<void> };

// Asking for one of these must not quietly get something else.
const UNSERVED = [
  "acl", "accelerate", "analytics", "attributes", "cors", "encryption", "intelligent-tiering", "inventory", "legal-hold", "lifecycle",
  "logging", "metrics", "notification", "object-lock", "ownershipControls", "partNumber", "policy", "policyStatus", "publicAccessBlock",
  "replication", "requestPayment", "restore", "retention", "select", "tagging", "torrent", "versioning", "versions", "versionId", "website",
];

const has = (request: StoreRequest, name: string) => param(request, name) !== undefined;
const notAllowed = () => new Refusal("MethodNotAllowed", "The specified method is not allowed against this resource.");

function answerService(store: Store, request: StoreRequest): Reply {
  if (request.method !== "GET") throw notAllowed();
  return { status: 200, xml: { name: "ListAllMyBucketsResult", content: { Buckets: { Bucket: store.names().map((Name) => ({ Name })) } } } };
}

async function answerBucket(store: Store, request: StoreRequest, auth: Authorised): Promise<Reply> {
  if (request.method === "PUT") {
    await store.create(request.bucket);
    return { status: 200, headers: { location: `/${request.bucket}` } };
  }
  const bucket = store.bucket(request.bucket);
  if (request.method === "HEAD") return { status: 200 };
  if (request.method === "DELETE") {
    await store.delete(request.bucket);
    return { status: 204 };
  }
  if (request.method === "POST" && has(request, "delete")) return deleteObjects(bucket, request, auth);
  if (request.method !== "GET") throw notAllowed();
  if (has(request, "location")) return { status: 200, xml: { name: "LocationConstraint", content: {} } };
  return has(request, "uploads") ? listUploads(bucket, request) : listObjects(bucket, request);
}

function answerObject(store: Store, request: StoreRequest, auth: Authorised): Reply | Promise<Reply> {
  const bucket = store.bucket(request.bucket);
  const ofUpload = has(request, "uploadId");
  switch (request.method) {
    case "GET":
      return ofUpload ? listParts(bucket, request) : getObject(bucket, request);
    case "HEAD":
      return getObject(bucket, request);
    case "PUT":
      if (ofUpload) return putPart(bucket, request, auth);
      return amzHeader(request, "x-amz-copy-source") === undefined ? putObject(bucket, request, auth) : copyObject(store, bucket, request);
    case "POST":
      if (has(request, "uploads")) return startUpload(bucket, request);
      if (ofUpload) return completeUpload(bucket, request, auth);
      throw notAllowed();
    case "DELETE":
      return ofUpload ? abortUpload(bucket, request) : deleteObject(bucket, request.key);
    default:
      throw notAllowed();
  }
}

async function answer(store: Store, options: FakeStoreOptions, request: StoreRequest): Promise<Reply> {
  if (request.method === "OPTIONS") return { status: 200, headers: preflightHeaders(request.headers, options.corsOrigins) };
  const auth = authorise(request, options, Date.now());
  const unserved = UNSERVED.find((name) => has(request, name) && !(name === "partNumber" && has(request, "uploadId")));
  if (unserved !== undefined) throw new Refusal("NotImplemented", `The store does not serve "${unserved}".`);
  if (request.bucket === "") return answerService(store, request);
  return request.key === "" ? answerBucket(store, request, auth) : answerObject(store, request, auth);
}

/** A known refusal as S3 would say it; anything else is a bug of ours, told on the error stream. */
function errorReply(error: unknown, path: string, requestId: string): Reply {
  const refusal = error instanceof Refusal ? error : new Refusal("InternalError", "We encountered an internal error. Please try again.");
  if (refusal !== error) console.error(error);
  if (refusal.code === "NotModified") return { status: 304, headers: refusal.headers };
  const content = { Code: refusal.code, Message: refusal.message, ...refusal.details, Resource: path, RequestId: requestId };
  return { status: refusal.status, headers: refusal.headers, xml: { name: "Error", content } };
}

/**
 * Starts an S3-compatible store for one machine: development, tests, a demonstration. Path-style addresses, SigV4
 * only, one pair of keys. A finished object survives a kill at any moment. It serves what the product uses, and
 * answers NotImplemented to the rest.
 */
export async function startFakeStore(options: FakeStoreOptions): Promise<FakeStore> {
  const store = await Store.open(options.directory);

  async function handle(incoming: IncomingMessage, response: ServerResponse): Promise<void> {
    const requestId = randomUUID();
    const method = incoming.method ?? "GET";
    const origin = incoming.headers.origin === undefined ? {} : { origin: incoming.headers.origin };
    response.setHeader("x-amz-request-id", requestId);
    for (const [name, value] of Object.entries(corsHeaders(origin, options.corsOrigins))) response.setHeader(name, value);
    let reply: Reply;
    try {
      reply = await answer(store, options, toStoreRequest(incoming, response));
    } catch (error) {
      // The client went away: nobody is left to answer.
      if (incoming.destroyed && !incoming.complete) return void response.destroy();
      reply = errorReply(error, incoming.url?.split("?")[0] ?? "/", requestId);
      // A client that waits for "100 Continue" won't send its body now, so the connection can't be used again.
      if (incoming.headers.expect !== undefined && !incoming.complete) response.setHeader("connection", "close");
    }
    await sendReply(response, method, reply);
  }

  const listener = (incoming: IncomingMessage, response: ServerResponse) =>
    void handle(incoming, response).catch((error: NodeJS.ErrnoException) => {
      if (error.code !== "ERR_STREAM_PREMATURE_CLOSE") console.error(error);
      response.destroy();
    });
  // A part from a phone on poor wi-fi may take longer than Node's five minutes.
  const server = createServer({ requestTimeout: 0, keepAliveTimeout: 65_000, highWaterMark: 256 * 1024 }, listener);
  server.on("checkContinue", listener);
  await new Promise<void>((resolve, reject) => server.once("error", reject).listen(options.port, options.host, resolve));
  const { port } = server.address() as AddressInfo;
  const host = options.host.includes(":") ? `[${options.host}]` : options.host;

  return {
    url: `http://${host}:${port}`,
    close: () =>
      new Promise((resolve) => {
        server.close(() => resolve());
        server.closeIdleConnections();
        setTimeout(() => server.closeAllConnections(), 2000).unref();
      }),
  };
}
