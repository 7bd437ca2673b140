import type { DoorSpec } from "@/lib/schemas/contract/door-spec";

/** Doors of observations. */
export const observationsDoors = {} as const satisfies Record<string, DoorSpec>;
