import { z } from "zod";
import type { DoorSpec } from "@/lib/schemas/contract/door-spec";
import {
  judgedReadingSchema,
  markCriterionSchema,
  sheetOutcomeSchema,
  signObservationSchema,
  startObservationSchema,
  stopForSafetySchema,
  withdrawSignOffSchema,
} from "@/lib/schemas/observations";

const sheetParams = z.object({ org: z.string(), observationId: z.uuid() });

/** Doors of the observation sheet and of sign-offs. The organisation is the assessor's. */
export const observationsDoors = {
  "POST /orgs/{org}/observations": {
    summary: "Open the observation sheet of a task for an apprentice",
    roles: ["assessor"],
    params: z.object({ org: z.string() }),
    body: startObservationSchema,
    response: z.object({ observationId: z.uuid() }),
  },
  "PUT /orgs/{org}/observations/{observationId}/marks/{criterionKey}": {
    summary: "Put down one criterion",
    roles: ["assessor"],
    params: sheetParams.extend({ criterionKey: z.string().min(1).max(40) }),
    body: markCriterionSchema,
    response: z.object({ mark: z.enum(["met", "not_yet", "not_seen"]).nullable(), judged: judgedReadingSchema.nullable(), filled: z.int() }),
  },
  "POST /orgs/{org}/observations/{observationId}/stop": {
    summary: "Stop for safety; the sheet can then only end as not yet",
    roles: ["assessor"],
    params: sheetParams,
    body: stopForSafetySchema,
    response: z.object({ stopped: z.literal(true) }),
  },
  "GET /orgs/{org}/observations/{observationId}/outcome": {
    summary: "The outcome as computed now, and the highest level the rules allow",
    roles: ["assessor"],
    params: sheetParams,
    response: sheetOutcomeSchema,
  },
  "POST /orgs/{org}/observations/{observationId}/sign-off": {
    summary: "Sign the finished sheet, with the password asked again",
    roles: ["assessor"],
    params: sheetParams,
    body: signObservationSchema,
    response: z.object({ signOffId: z.uuid(), outcome: z.enum(["met", "not_yet"]), level: z.int().nullable() }),
  },
  "POST /orgs/{org}/sign-offs/{signOffId}/withdrawal": {
    summary: "Withdraw a sign-off by a further entry with a reason",
    roles: ["assessor", "verifier"],
    params: z.object({ org: z.string(), signOffId: z.uuid() }),
    body: withdrawSignOffSchema,
    response: z.object({ withdrawn: z.literal(true) }),
  },
} as const satisfies Record<string, DoorSpec>;
