/**
 * Writes a WebVTT timestamp, always with hours.
 * @param ms  whole milliseconds, at least 0
 * @source W3C WebVTT, "WebVTT timestamp"
 */
export function formatTimestamp(ms: number): string {
  const pad = (value: number, width: number) => String(value).padStart(width, "0");
  const [hours, minutes, seconds] = [Math.floor(ms / 3_600_000), Math.floor(ms / 60_000) % 60, Math.floor(ms / 1000) % 60];
  return `${pad(hours, 2)}:${pad(minutes, 2)}:${pad(seconds, 2)}.${pad(ms % 1000, 3)}`;
}

/**
 * Reads a WebVTT timestamp as an author must write it: hours of two digits or more, or none; minutes and seconds up to 59.
 * @returns whole milliseconds, or undefined for any other shape
 * @source W3C WebVTT, "WebVTT timestamp"
 */
export function parseTimestamp(text: string): number | undefined {
  const match = /^(?:(\d{2,}):)?([0-5]\d):([0-5]\d)\.(\d{3})$/.exec(text);
  if (!match) return undefined;
  const [, hours = "0", minutes, seconds, thousandths] = match;
  return ((Number(hours) * 60 + Number(minutes)) * 60 + Number(seconds)) * 1000 + Number(thousandths);
}

/** A time as people read it beside a film: "4:07", "1:02:09". @param ms whole milliseconds */
export function formatClock(ms: number): string {
  const total = Math.floor(ms / 1000);
  const [hours, minutes, seconds] = [Math.floor(total / 3600), Math.floor(total / 60) % 60, total % 60];
  const tail = `${String(seconds).padStart(2, "0")}`;
  return hours > 0 ? `${hours}:${String(minutes).padStart(2, "0")}:${tail}` : `${minutes}:${tail}`;
}
