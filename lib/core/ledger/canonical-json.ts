import canonicalize from "canonicalize";

/**
 * Canonical JSON: the one text that a value has, so that its hash means the same everywhere.
 * @throws TypeError for what JSON can't carry: undefined, functions, NaN or infinity, lone surrogates, and objects of a class (a Date, a
 *         Map), which JSON would change or empty.
 * @source RFC 8785 (JSON Canonicalization Scheme)
 */
export function canonicalJson(value: unknown): string {
  assertJson(value, "$");
  const text = canonicalize(value);
  if (text === undefined) throw new TypeError("There is nothing to write as JSON.");
  return text;
}

/** With the u flag a pair is one character, so only a surrogate that stands alone matches. */
const LONE_SURROGATE = /[\uD800-\uDFFF]/u;

/** The library lets some of these through or drops them silently; a ledger must not. */
function assertJson(value: unknown, path: string): void {
  if (typeof value === "string") {
    if (LONE_SURROGATE.test(value)) throw new TypeError(`${path}: a lone surrogate is no text.`);
  } else if (typeof value === "number") {
    if (!Number.isFinite(value)) throw new TypeError(`${path}: ${value} is no JSON number.`);
  } else if (Array.isArray(value)) {
    // By index, since forEach passes over holes.
    for (let index = 0; index < value.length; index += 1) assertJson(value[index], `${path}[${index}]`);
  } else if (value !== null && typeof value === "object") {
    if (!isPlain(value)) throw new TypeError(`${path}: only plain objects can be written as JSON.`);
    for (const [key, item] of Object.entries(value)) {
      assertJson(key, `${path} key`);
      assertJson(item, `${path}.${key}`);
    }
  } else if (value !== null && typeof value !== "boolean") {
    throw new TypeError(`${path}: ${typeof value} can't be written as JSON.`);
  }
}

function isPlain(value: object): boolean {
  const prototype: unknown = Object.getPrototypeOf(value);
  return (prototype === null || prototype === Object.prototype) && !("toJSON" in value);
}
