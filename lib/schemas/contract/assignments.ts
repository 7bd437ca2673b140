import type { DoorSpec } from "@/lib/schemas/contract/door-spec";

/** Doors of assignments. */
export const assignmentsDoors = {} as const satisfies Record<string, DoorSpec>;
