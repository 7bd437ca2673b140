import { z } from "zod";
import type { DoorSpec } from "@/lib/schemas/contract/door-spec";
import { bookingSchema, evidenceSchema, practiceRunSchema } from "@/lib/schemas/tasks";

const taskParams = z.object({ org: z.string(), taskId: z.uuid() });

/** Doors of practising a task, its evidence, and being ready. */
export const tasksDoors = {
  "POST /orgs/{org}/tasks/{taskId}/practice-runs": {
    summary: "Log a practice run of one's own",
    roles: ["apprentice"],
    params: taskParams,
    body: practiceRunSchema,
    response: z.object({ practiceRunId: z.uuid() }),
  },
  "POST /orgs/{org}/practice-runs/{practiceRunId}/confirmation": {
    summary: "Confirm a practice run as witness; this is not a sign-off",
    roles: ["mentor"],
    params: z.object({ org: z.string(), practiceRunId: z.uuid() }),
    response: z.object({ confirmed: z.literal(true) }),
  },
  "POST /orgs/{org}/tasks/{taskId}/evidence": {
    summary: "Add a photo that was uploaded as evidence for a task",
    roles: ["apprentice"],
    params: taskParams,
    body: evidenceSchema,
    response: z.object({ evidenceId: z.uuid() }),
  },
  "DELETE /orgs/{org}/evidence/{evidenceId}": {
    summary: "Take away evidence of one's own that no observation has used yet",
    roles: ["apprentice"],
    params: z.object({ org: z.string(), evidenceId: z.uuid() }),
    response: z.object({ removed: z.literal(true) }),
  },
  "PUT /orgs/{org}/tasks/{taskId}/readiness": {
    summary: "Say: I am ready to be seen",
    roles: ["apprentice"],
    params: taskParams,
    response: z.object({ ready: z.literal(true) }),
  },
  "DELETE /orgs/{org}/tasks/{taskId}/readiness": {
    summary: "Take “ready” back",
    roles: ["apprentice"],
    params: taskParams,
    response: z.object({ ready: z.literal(false) }),
  },
  "PUT /orgs/{org}/readiness/{readinessId}/booking": {
    summary: "Book when an apprentice will be observed",
    roles: ["assessor"],
    params: z.object({ org: z.string(), readinessId: z.uuid() }),
    body: bookingSchema,
    response: z.object({ booked: z.literal(true) }),
  },
} as const satisfies Record<string, DoorSpec>;
