import type { DoorSpec } from "@/lib/schemas/contract/door-spec";

/** Doors of uploads. */
export const uploadsDoors = {} as const satisfies Record<string, DoorSpec>;
