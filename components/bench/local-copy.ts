import type { Draft } from "@/components/bench/bench-state";

/** A draft on this device, and the version of the server's that it was made on. */
export type LocalCopy = { draft: Draft; version: number };

const key = (recordingId: string): string => `bench ${recordingId}`;

/** What of a recording's marking out the server had not taken yet. Null where there is nothing, or nothing that can be read. */
export function readCopy(recordingId: string): LocalCopy | null {
  try {
    const copy = JSON.parse(localStorage.getItem(key(recordingId)) ?? "null") as LocalCopy | null;
    return copy && Array.isArray(copy.draft?.steps) && Array.isArray(copy.draft.questions) && Number.isInteger(copy.version) ? copy : null;
  } catch {
    return null;
  }
}

/** Keeps a draft on this device. @returns false where the device has no room or allows no keeping */
export function writeCopy(recordingId: string, copy: LocalCopy): boolean {
  try {
    localStorage.setItem(key(recordingId), JSON.stringify(copy));
    return true;
  } catch {
    return false;
  }
}

export function dropCopy(recordingId: string): void {
  try {
    localStorage.removeItem(key(recordingId));
  } catch {
    // Where nothing may be kept there is nothing to drop.
  }
}
