import { createHash } from "node:crypto";
import type { Authorised } from "@/storage/fake/authorise";
import {
  CHECKSUM_ALGORITHMS, checksumHeaderName, readAlgorithm, startChecksum, type Checksum, type ChecksumAlgorithm,
} from "@/storage/fake/checksums";
import { decodeChunked } from "@/storage/fake/chunked";
import { Refusal } from "@/storage/fake/refusal";
import { amzHeader, type StoreRequest } from "@/storage/fake/request";

/**
 * The body of a request. `chunks` must be read to its end: it throws there when a digest that the client sent
 * does not fit, so that whoever writes the bytes throws them away. `md5` and `checksum` are known after that.
 */
export type ReceivedBody = {
  chunks: AsyncIterable<Buffer>;
  sizeBytes: number;
  md5(): string;
  checksum(): Checksum | undefined;
};

export const MAX_PUT_BYTES = 5 * 1024 ** 3;

function declaredSize(request: StoreRequest, chunked: boolean): number {
  const text = chunked ? request.headers["x-amz-decoded-content-length"] : request.headers["content-length"];
  if (text === undefined || !/^\d{1,15}$/.test(text)) {
    throw new Refusal("MissingContentLength", "You must provide the Content-Length HTTP header.");
  }
  const sizeBytes = Number(text);
  if (sizeBytes > MAX_PUT_BYTES) throw new Refusal("EntityTooLarge", "Your proposed upload exceeds the maximum allowed size.");
  return sizeBytes;
}

function contentMd5(request: StoreRequest): string | undefined {
  const given = request.headers["content-md5"];
  if (given === undefined) return undefined;
  const bytes = Buffer.from(given, "base64");
  if (bytes.length !== 16) throw new Refusal("InvalidDigest", "The Content-MD5 you specified is not valid.");
  return bytes.toString("hex");
}

/** The checksum to work out: one whose value is sent, one announced for the trailer, or the one that the upload agreed on. */
function checksumToCheck(request: StoreRequest, agreed: ChecksumAlgorithm | undefined) {
  const sent = CHECKSUM_ALGORITHMS.filter((each) => amzHeader(request, checksumHeaderName(each)) !== undefined);
  if (sent.length > 1) throw new Refusal("InvalidRequest", "Expecting a single x-amz-checksum- header.");
  const [algorithm] = sent;
  if (algorithm) return { algorithm, expected: amzHeader(request, checksumHeaderName(algorithm)) };
  const trailer = /^x-amz-checksum-(\w+)$/.exec(request.headers["x-amz-trailer"] ?? "")?.[1];
  if (trailer !== undefined) return { algorithm: readAlgorithm(trailer), expected: undefined };
  return agreed === undefined ? undefined : { algorithm: agreed, expected: undefined };
}

/**
 * Opens the body of a PUT or POST, and lets a client that waits for "100 Continue" go on.
 * @param agreed an algorithm to work out even if the client sends no value of it.
 * @throws Refusal MissingContentLength, EntityTooLarge, InvalidDigest; while reading: BadDigest, IncompleteBody, MalformedTrailerError,
 *   XAmzContentSHA256Mismatch, SignatureDoesNotMatch
 */
export function receiveBody(request: StoreRequest, auth: Authorised, agreed?: ChecksumAlgorithm): ReceivedBody {
  const chunked = auth.payloadHash.startsWith("STREAMING-");
  const expectedSha256 = /^[0-9a-f]{64}$/.test(auth.payloadHash) ? auth.payloadHash : undefined;
  const sizeBytes = declaredSize(request, chunked);
  const expectedMd5 = contentMd5(request);
  const wanted = checksumToCheck(request, agreed);
  const running = wanted && startChecksum(wanted.algorithm);
  let trailers: Record<string, string> = {};
  let md5: string | undefined;
  let checksum: Checksum | undefined;

  if (request.headers.expect?.toLowerCase() === "100-continue") request.response.writeContinue();
  const signed = auth.payloadHash.startsWith("STREAMING-AWS4-HMAC-SHA256-PAYLOAD");
  // Stopping early must leave the connection whole: the refusal still has to reach the client.
  const incoming: AsyncIterable<Buffer> = request.incoming.iterator({ destroyOnReturn: false });
  const plain = chunked
    ? decodeChunked(incoming, auth, signed, (sent) => { trailers = sent; })
    : incoming;

  async function* checked(): AsyncGenerator<Buffer> {
    const md5Hash = createHash("md5");
    const sha256 = expectedSha256 === undefined ? undefined : createHash("sha256");
    let received = 0;
    for await (const chunk of plain) {
      received += chunk.length;
      if (received > sizeBytes) break;
      md5Hash.update(chunk);
      sha256?.update(chunk);
      running?.update(chunk);
      yield chunk;
    }
    if (received !== sizeBytes) throw new Refusal("IncompleteBody", "The body is not as long as its declared length.");
    if (sha256 && sha256.digest("hex") !== expectedSha256) {
      throw new Refusal("XAmzContentSHA256Mismatch", "The provided 'x-amz-content-sha256' header does not match what was computed.");
    }
    md5 = md5Hash.digest("hex");
    if (expectedMd5 !== undefined && md5 !== expectedMd5) {
      throw new Refusal("BadDigest", "The Content-MD5 you specified did not match what we received.");
    }
    if (!wanted || !running) return;
    const value = running.digest().toString("base64");
    const expected = wanted.expected ?? trailers[checksumHeaderName(wanted.algorithm)];
    if (expected === undefined && request.headers["x-amz-trailer"] !== undefined) {
      throw new Refusal("MalformedTrailerError", "The request announced a trailing checksum and did not send it.");
    }
    if (expected !== undefined && expected !== value) {
      throw new Refusal("BadDigest", `The ${wanted.algorithm} you specified did not match the calculated checksum.`);
    }
    checksum = { algorithm: wanted.algorithm, value, type: "FULL_OBJECT" };
  }

  return {
    chunks: checked(),
    sizeBytes,
    md5: () => md5 ?? "",
    checksum: () => checksum,
  };
}

/** Reads a small document whole, checked like any body. @throws Refusal EntityTooLarge over `maxBytes`, and as receiveBody */
export async function receiveText(request: StoreRequest, auth: Authorised, maxBytes: number): Promise<string> {
  const body = receiveBody(request, auth);
  if (body.sizeBytes > maxBytes) throw new Refusal("EntityTooLarge", "The document is too long.");
  const chunks: Buffer[] = [];
  for await (const chunk of body.chunks) chunks.push(chunk);
  return Buffer.concat(chunks).toString("utf8");
}
