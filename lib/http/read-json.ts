import { AppError } from "@/lib/core/errors";

const LIMIT_BYTES = 4 * 1024 * 1024;

/**
 * The body as JSON, read no further than the limit whatever the headers claim.
 * @throws AppError("too_large" | "invalid_input")
 */
export async function readJson(request: Request): Promise<unknown> {
  const chunks: Uint8Array[] = [];
  let size = 0;
  if (request.body) {
    for await (const chunk of request.body as unknown as AsyncIterable<Uint8Array>) {
      size += chunk.byteLength;
      if (size > LIMIT_BYTES) throw new AppError("too_large", "That is more than can be taken at once (4 MB). Nothing was changed.");
      chunks.push(chunk);
    }
  }
  try {
    return JSON.parse(Buffer.concat(chunks).toString("utf8"));
  } catch {
    throw new AppError("invalid_input", "The request's body is not JSON.");
  }
}
