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

/** A time as people read it beside a film: "4:07", "1:02:09". @param ms whole milliseconds */
export function formatClock(ms: number): string {
  const total = Math.floor(ms / 1000);
  const [hours, minutes, seconds] = [Math.floor(total / 3600), Math.floor(total / 60) % 60, total % 60];
  const tail = `${String(seconds).padStart(2, "0")}`;
  return hours > 0 ? `${hours}:${String(minutes).padStart(2, "0")}:${tail}` : `${minutes}:${tail}`;
}
