/** First and last byte, both included. */
export type ByteRange = { start: number; end: number };

/**
 * Reads a Range header against a body of `sizeBytes`.
 *
 * @returns the one range, cut at the end of the body; "unsatisfiable" (answer 416); or undefined when the header is
 *   to be ignored and the whole body sent: another unit, malformed, last before first, or several ranges, which S3
 *   does not serve and RFC 9110 lets a server ignore.
 * @source RFC 9110, sections 14.1.1, 14.1.2 and 14.2.
 */
export function readRange(header: string, sizeBytes: number): ByteRange | "unsatisfiable" | undefined {
  const match = /^bytes=[ \t]*(\d*)-(\d*)[ \t]*$/i.exec(header);
  if (!match) return undefined;
  const [, first = "", last = ""] = match;
  if (first === "") {
    if (last === "") return undefined;
    const suffix = Math.min(Number(last), sizeBytes);
    return suffix === 0 ? "unsatisfiable" : { start: sizeBytes - suffix, end: sizeBytes - 1 };
  }
  const start = Number(first);
  if (last !== "" && Number(last) < start) return undefined;
  if (start >= sizeBytes) return "unsatisfiable";
  return { start, end: last === "" ? sizeBytes - 1 : Math.min(Number(last), sizeBytes - 1) };
}
