import type { DoorSpec } from "@/lib/schemas/contract/door-spec";

/** Doors of the API itself and of a person's own account. */
export const accountsDoors = {
  "GET /openapi.json": {
    summary: "This document",
    roles: "anyone",
    response: { file: "application/json" },
  },
} as const satisfies Record<string, DoorSpec>;
