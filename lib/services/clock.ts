/** The server's day as yyyy-mm-dd, in UTC: one calendar for every instance. Core takes days as arguments and never asks the clock. */
export function today(now: Date = new Date()): string {
  return now.toISOString().slice(0, 10);
}
