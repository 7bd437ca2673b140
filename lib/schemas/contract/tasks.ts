import type { DoorSpec } from "@/lib/schemas/contract/door-spec";

/** Doors of tasks. */
export const tasksDoors = {} as const satisfies Record<string, DoorSpec>;
