import type { DoorSpec } from "@/lib/schemas/contract/door-spec";

/** Doors of modules. */
export const modulesDoors = {} as const satisfies Record<string, DoorSpec>;
