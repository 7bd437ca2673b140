import { z } from "zod";
import type { DoorSpec } from "@/lib/schemas/contract/door-spec";
import { mediaSchema } from "@/lib/schemas/media";
import { captionsSchema, changeRecordingSchema, recordingListItemSchema, recordingSchema } from "@/lib/schemas/recordings";

const recordingParams = z.object({ org: z.string(), recordingId: z.uuid() });
const MENTORS = ["mentor"] as const;

/** Doors of recordings. A recording begins where an upload is completed. */
export const recordingsDoors = {
  "GET /orgs/{org}/recordings": {
    summary: "The workshop's recordings, newest first",
    roles: MENTORS,
    params: z.object({ org: z.string() }),
    response: z.object({ recordings: z.array(recordingListItemSchema) }),
  },
  "GET /orgs/{org}/recordings/{recordingId}": {
    summary: "A recording, how far its preparing is, and where it is used",
    roles: MENTORS,
    params: recordingParams,
    response: recordingSchema,
  },
  "PATCH /orgs/{org}/recordings/{recordingId}": {
    summary: "Change title, vehicle, consent, or the note that private details were looked for",
    roles: MENTORS,
    params: recordingParams,
    body: changeRecordingSchema,
    response: z.object({ changed: z.literal(true) }),
  },
  "DELETE /orgs/{org}/recordings/{recordingId}": {
    summary: "Put away a recording that no module is made of",
    roles: MENTORS,
    params: recordingParams,
    response: z.object({ putAway: z.literal(true) }),
  },
  "POST /orgs/{org}/recordings/{recordingId}/preparation": {
    summary: "Try again to prepare a recording that could not be prepared",
    roles: MENTORS,
    params: recordingParams,
    response: z.object({ started: z.literal(true) }),
  },
  "GET /orgs/{org}/recordings/{recordingId}/media": {
    summary: "Signed addresses of a recording's films and pictures, and its captions as WebVTT",
    roles: MENTORS,
    params: recordingParams,
    response: mediaSchema,
  },
  "PUT /orgs/{org}/recordings/{recordingId}/captions": {
    summary: "Take in captions from WebVTT or SubRip text, whole or not at all",
    roles: MENTORS,
    params: recordingParams,
    body: captionsSchema,
    response: z.object({ cues: z.int() }),
  },
} as const satisfies Record<string, DoorSpec>;
