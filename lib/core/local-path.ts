/**
 * An address to return to, if it leads to a page of this site and nowhere else.
 * @param next  as it came in the address; anything at all.
 * @returns     path with query and fragment, or undefined: no other host, no `//host`, no backslash or control character, no API address.
 */
export function localPath(next: unknown): string | undefined {
  if (typeof next !== "string" || !/^\/(?![/\\])[\x21-\x5b\x5d-\x7e]*$/.test(next) || next.length > 2000) return undefined;
  const base = "http://local.invalid";
  const url = new URL(next, base);
  if (url.origin !== base || url.pathname.startsWith("/api/") || url.pathname.startsWith("//")) return undefined;
  return `${url.pathname}${url.search}${url.hash}`;
}
