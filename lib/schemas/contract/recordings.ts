import type { DoorSpec } from "@/lib/schemas/contract/door-spec";

/** Doors of recordings. */
export const recordingsDoors = {} as const satisfies Record<string, DoorSpec>;
