import type { DoorSpec } from "@/lib/schemas/contract/door-spec";

/** Doors of cohorts. */
export const cohortsDoors = {} as const satisfies Record<string, DoorSpec>;
