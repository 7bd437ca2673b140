import type { ObjectRecord } from "@/storage/fake/records";
import { Refusal } from "@/storage/fake/refusal";
import type { StoreRequest } from "@/storage/fake/request";

type Headers = StoreRequest["headers"];

const failed = (condition: string) =>
  new Refusal("PreconditionFailed", "At least one of the pre-conditions you specified did not hold", { details: { Condition: condition } });

const opaque = (tag: string) => tag.trim().replace(/^W\//, "").replace(/^"|"$/g, "");
const names = (list: string, etag: string) => list.split(",").some((tag) => tag.trim() === "*" || opaque(tag) === etag);

/** A date header in whole seconds, or undefined if it is not a date and so must be ignored. */
function seconds(header: string | undefined): number | undefined {
  const ms = header === undefined ? Number.NaN : Date.parse(header);
  return Number.isNaN(ms) ? undefined : Math.floor(ms / 1000);
}

/**
 * The conditions of a GET or HEAD, in the order that the standard sets.
 * @throws Refusal PreconditionFailed (412) or NotModified (304)
 * @source RFC 9110, section 13.2.2.
 */
export function checkReadConditions(headers: Headers, record: ObjectRecord): void {
  const modified = Math.floor(record.modifiedMs / 1000);
  const unmodifiedSince = seconds(headers["if-unmodified-since"]);
  if (headers["if-match"] !== undefined) {
    if (!names(headers["if-match"], record.etag)) throw failed("If-Match");
  } else if (unmodifiedSince !== undefined && modified > unmodifiedSince) throw failed("If-Unmodified-Since");

  const notModified = new Refusal("NotModified", "Not modified", { headers: { etag: `"${record.etag}"` } });
  const modifiedSince = seconds(headers["if-modified-since"]);
  if (headers["if-none-match"] !== undefined) {
    if (names(headers["if-none-match"], record.etag)) throw notModified;
  } else if (modifiedSince !== undefined && modified <= modifiedSince) throw notModified;
}

/** Whether a Range header still means this object: If-Range wants a strong match. @source RFC 9110, section 13.1.5. */
export function rangeStillApplies(headers: Headers, record: ObjectRecord): boolean {
  const condition = headers["if-range"];
  if (condition === undefined) return true;
  if (condition.startsWith('"')) return condition === `"${record.etag}"`;
  return seconds(condition) === Math.floor(record.modifiedMs / 1000);
}

/**
 * The conditions of a PUT or of completing an upload. Check them in the key's turn, just before writing.
 * @throws Refusal PreconditionFailed, or NoSuchKey for If-Match on an object that isn't there
 * @source Amazon S3 user guide, "Conditional writes".
 */
export function checkWriteConditions(headers: Headers, existing: ObjectRecord | undefined): void {
  const { "if-none-match": noneMatch, "if-match": match } = headers;
  if (noneMatch !== undefined && existing && names(noneMatch, existing.etag)) throw failed("If-None-Match");
  if (match === undefined) return;
  if (!existing) throw new Refusal("NoSuchKey", "The specified key does not exist.");
  if (!names(match, existing.etag)) throw failed("If-Match");
}
