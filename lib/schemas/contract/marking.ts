import type { DoorSpec } from "@/lib/schemas/contract/door-spec";

/** Doors of marking. */
export const markingDoors = {} as const satisfies Record<string, DoorSpec>;
