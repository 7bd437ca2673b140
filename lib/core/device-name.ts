// Order matters: most browsers also claim to be an older one.
const BROWSERS: [RegExp, string][] = [
  [/\bEdgA?\//, "Edge"],
  [/\bOPR\//, "Opera"],
  [/\bFirefox\/|\bFxiOS\//, "Firefox"],
  [/Chrom(e|ium)\/|\bCriOS\//, "Chrome"],
  [/\bSafari\//, "Safari"],
];
const SYSTEMS: [RegExp, string][] = [
  [/\bAndroid\b/, "Android"],
  [/\biPhone\b/, "iPhone"],
  [/\biPad\b/, "iPad"],
  [/\bWindows\b/, "Windows"],
  [/\bMac OS X\b/, "Mac"],
  [/\bCrOS\b/, "ChromeOS"],
  [/\bLinux\b/, "Linux"],
];

/** A device's name for people, from the User-Agent header as its browser sent it: good enough to recognise one's own phone, no more. */
export function deviceName(userAgent: string): string {
  const named = (list: [RegExp, string][]) => list.find(([pattern]) => pattern.test(userAgent))?.[1];
  const [browser, system] = [named(BROWSERS), named(SYSTEMS)];
  if (browser && system) return `${browser} on ${system}`;
  return browser ?? system ?? "A device that did not say what it is";
}
