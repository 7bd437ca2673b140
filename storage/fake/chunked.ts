import { createHash } from "node:crypto";
import type { Authorised } from "@/storage/fake/authorise";
import { Refusal } from "@/storage/fake/refusal";
import { ALGORITHM, EMPTY_SHA256, scopeText, sha256Hex, signText } from "@/storage/fake/signature";

const MAX_LINE_BYTES = 8192;
const incomplete = () => new Refusal("IncompleteBody", "The body ended before its last chunk.");

/** Reads lines and counted runs of bytes off a stream, without copying what it passes on. */
class ByteReader {
  #source: AsyncIterator<Buffer>;
  #held: Buffer = Buffer.alloc(0);

  constructor(source: AsyncIterable<Buffer>) {
    this.#source = source[Symbol.asyncIterator]();
  }

  async #more(): Promise<boolean> {
    const next = await this.#source.next();
    if (next.done) return false;
    this.#held = this.#held.length === 0 ? next.value : Buffer.concat([this.#held, next.value]);
    return true;
  }

  /** A line without its CR LF; an empty one at the end of the stream. */
  async line(): Promise<string> {
    for (;;) {
      const end = this.#held.indexOf("\n");
      if (end >= 0) {
        const text = this.#held.toString("utf8", 0, end).replace(/\r$/, "");
        this.#held = this.#held.subarray(end + 1);
        return text;
      }
      if (this.#held.length > MAX_LINE_BYTES) throw new Refusal("InvalidRequest", "A chunk's header is too long.");
      if (!(await this.#more())) {
        if (this.#held.length > 0) throw incomplete();
        return "";
      }
    }
  }

  async *take(sizeBytes: number): AsyncGenerator<Buffer> {
    let left = sizeBytes;
    while (left > 0) {
      if (this.#held.length === 0 && !(await this.#more())) throw incomplete();
      const piece = this.#held.subarray(0, left);
      this.#held = this.#held.subarray(piece.length);
      left -= piece.length;
      yield piece;
    }
  }
}

/** Each chunk's signature covers the one before it, so that none can be changed, dropped or moved. */
class SignatureChain {
  #previous: string;

  constructor(private readonly auth: Authorised) {
    this.#previous = auth.signature;
  }

  check(kind: "PAYLOAD" | "TRAILER", hashes: string[], given: string | undefined): void {
    const { date, scope, key } = this.auth;
    const text = [`${ALGORITHM}-${kind}`, date, scopeText(scope), this.#previous, ...hashes].join("\n");
    this.#previous = signText(key, text);
    if (given !== this.#previous) throw new Refusal("SignatureDoesNotMatch", "The signature of a chunk does not match its bytes.");
  }
}

/**
 * Decodes an `aws-chunked` body and yields its bytes; every chunk's signature is checked when `signed`.
 * @param onTrailers gets the trailing headers, names in lower case, once all bytes were yielded.
 * @throws Refusal IncompleteBody, SignatureDoesNotMatch, InvalidRequest
 * @source Amazon S3 API reference, "Signature calculations … transferring payload in multiple chunks", and the same with trailers.
 */
export async function* decodeChunked(
  source: AsyncIterable<Buffer>,
  auth: Authorised,
  signed: boolean,
  onTrailers: (trailers: Record<string, string>) => void,
): AsyncGenerator<Buffer> {
  const reader = new ByteReader(source);
  const chain = new SignatureChain(auth);
  for (;;) {
    const [, size, signature] = /^([0-9a-fA-F]{1,8})(?:;chunk-signature=([0-9a-f]{64}))?$/.exec(await reader.line()) ?? [];
    if (size === undefined) throw new Refusal("InvalidRequest", "A chunk has no valid size.");
    const hash = signed ? createHash("sha256") : undefined;
    for await (const piece of reader.take(Number.parseInt(size, 16))) {
      hash?.update(piece);
      yield piece;
    }
    if (hash) chain.check("PAYLOAD", [EMPTY_SHA256, hash.digest("hex")], signature);
    if (/^0+$/.test(size)) break;
    if ((await reader.line()) !== "") throw new Refusal("InvalidRequest", "A chunk is longer than its size says.");
  }

  const trailers: Record<string, string> = {};
  for (let line = await reader.line(); line !== ""; line = await reader.line()) {
    const colon = line.indexOf(":");
    trailers[line.slice(0, colon).trim().toLowerCase()] = line.slice(colon + 1).trim();
  }
  const { "x-amz-trailer-signature": signature, ...rest } = trailers;
  if (signed && Object.keys(rest).length > 0) {
    const text = Object.entries(rest).map(([name, value]) => `${name}:${value}\n`).join("");
    chain.check("TRAILER", [sha256Hex(text)], signature);
  }
  onTrailers(rest);
}
