const MIB = 1024 * 1024;

/** Large enough that the store's answers cost little, small enough that a lost connection loses little. */
const COMFORTABLE_PART_BYTES = 8 * MIB;

/** So many that the store lists them in one answer, far below its limit of 10,000. */
const MOST_PARTS = 1000;

/** Size of every part but the last: whole MiB, growing with the file. */
export function partSizeBytes(fileBytes: number): number {
  return Math.max(COMFORTABLE_PART_BYTES, Math.ceil(fileBytes / MOST_PARTS / MIB) * MIB);
}

/** How many parts the file has; numbers run from 1. */
export const partCount = (fileBytes: number, partBytes: number): number => Math.max(1, Math.ceil(fileBytes / partBytes));

/** First byte and the byte after the last of part `number`. */
export function partRange(number: number, fileBytes: number, partBytes: number): { start: number; end: number } {
  const start = (number - 1) * partBytes;
  return { start, end: Math.min(start + partBytes, fileBytes) };
}
