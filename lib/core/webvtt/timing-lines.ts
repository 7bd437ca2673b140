/** A line that times a cue: its 1-based line and its times in whole ms. */
export type TimingLine = { line: number; startMs: number; endMs: number };

const TIME = String.raw`(?:(\d+):)?([0-5]\d):([0-5]\d)\.(\d{3})(?!\d)`;
// More forgiving than what an author may write: hours of one digit, no space about the arrow, anything after the second time.
const TIMING = new RegExp(String.raw`^[ \t\f]*${TIME}[ \t\f]*-->[ \t\f]*${TIME}`);

const toMs = (hours = "0", minutes = "0", seconds = "0", thousandths = "0"): number =>
  ((Number(hours) * 60 + Number(minutes)) * 60 + Number(seconds)) * 1000 + Number(thousandths);

/**
 * The timing lines of a file in the order in which webvtt-parser gives back its cues (by start, of those with one start the longest
 * first, else as they stand): it gives no lines itself. Lines inside comments and styles time nothing.
 * @source W3C WebVTT, "collect WebVTT cue timings and settings"
 */
export function timingLines(lines: readonly string[]): TimingLine[] {
  const found: TimingLine[] = [];
  // A comment or style begins where an id could stand, and ends at the next blank line.
  let place: "header" | "between" | "in a cue" | "passed over" = "header";
  for (const [index, text] of lines.entries()) {
    if (index === 0) continue;
    if (text === "") place = "between";
    else if (place === "between" && !text.includes("-->") && /^(NOTE|STYLE)($|[ \t])/.test(text)) place = "passed over";
    else if (place !== "passed over" && text.includes("-->")) {
      place = "in a cue";
      const [, ...parts] = TIMING.exec(text) ?? [];
      if (parts.length > 0) found.push({ line: index + 1, startMs: toMs(...parts.slice(0, 4)), endMs: toMs(...parts.slice(4)) });
    }
  }
  return found.toSorted((a, b) => a.startMs - b.startMs || b.endMs - a.endMs);
}
