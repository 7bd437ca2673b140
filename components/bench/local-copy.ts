import type { Draft } from "@/components/bench/bench-state";

/** A draft on this device, and the version of the server's that it was made on. */
export type LocalCopy = { draft: Draft; version: number };

/** What the server has not taken yet, and what was taken off the bench for somebody else's. */
export type CopyPlace = "unsaved" | "replaced";

const key = (recordingId: string, place: CopyPlace): string => `bench ${place} ${recordingId}`;

/** What this device keeps of a recording's marking out. Null where there is nothing, or nothing that can be read. */
export function readCopy(recordingId: string, place: CopyPlace): LocalCopy | null {
  try {
    const copy = JSON.parse(localStorage.getItem(key(recordingId, place)) ?? "null") as LocalCopy | null;
    return copy && Array.isArray(copy.draft?.steps) && Array.isArray(copy.draft.questions) && Number.isInteger(copy.version) ? copy : null;
  } catch {
    return null;
  }
}

/** Keeps a draft on this device. @returns false where the device has no room or allows no keeping */
export function writeCopy(recordingId: string, place: CopyPlace, copy: LocalCopy): boolean {
  try {
    localStorage.setItem(key(recordingId, place), JSON.stringify(copy));
    return true;
  } catch {
    return false;
  }
}

/** Keeps it no longer. */
export function dropCopy(recordingId: string, place: CopyPlace): void {
  try {
    localStorage.removeItem(key(recordingId, place));
  } catch {
    // Where nothing may be kept there is nothing to drop.
  }
}
