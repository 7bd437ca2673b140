import type { DoorSpec } from "@/lib/schemas/contract/door-spec";

/** Doors of people. */
export const peopleDoors = {} as const satisfies Record<string, DoorSpec>;
