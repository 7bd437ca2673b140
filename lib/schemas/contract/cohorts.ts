import { z } from "zod";
import type { DoorSpec } from "@/lib/schemas/contract/door-spec";

/** Doors of cohorts and their exports. */
export const cohortsDoors = {
  "GET /orgs/{org}/cohorts/{cohortId}/progress.csv": {
    summary: "A cohort's progress, one row for each apprentice and task",
    roles: ["liaison"],
    params: z.object({ org: z.string(), cohortId: z.uuid() }),
    response: { file: "text/csv" },
  },
} as const satisfies Record<string, DoorSpec>;
