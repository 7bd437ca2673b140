import { z } from "zod";
import type { DoorSpec } from "@/lib/schemas/contract/door-spec";
import { importMarkingSchema, markingSavedSchema, markingSchema, markingViewSchema } from "@/lib/schemas/marking";

const recordingParams = z.object({ org: z.string(), recordingId: z.uuid() });

/** Doors of marking out a recording: steps, facts and questions, also as WebVTT. */
export const markingDoors = {
  "GET /orgs/{org}/recordings/{recordingId}/marking": {
    summary: "Steps and questions of a recording, with answers, and who saved them last",
    roles: ["mentor"],
    params: recordingParams,
    response: markingViewSchema,
  },
  "PUT /orgs/{org}/recordings/{recordingId}/marking": {
    summary: "Save the marking out as a whole",
    roles: ["mentor"],
    params: recordingParams,
    body: markingSchema,
    response: markingSavedSchema,
  },
  "GET /orgs/{org}/recordings/{recordingId}/chapters.vtt": {
    summary: "Steps as a WebVTT chapters track",
    roles: ["mentor"],
    params: recordingParams,
    response: { file: "text/vtt" },
  },
  "GET /orgs/{org}/recordings/{recordingId}/questions.vtt": {
    summary: "Facts and questions as a WebVTT metadata track",
    roles: ["mentor"],
    params: recordingParams,
    response: { file: "text/vtt" },
  },
  "GET /orgs/{org}/recordings/{recordingId}/captions.vtt": {
    summary: "Captions as WebVTT",
    roles: ["mentor"],
    params: recordingParams,
    response: { file: "text/vtt" },
  },
  "POST /orgs/{org}/recordings/{recordingId}/marking/imports": {
    summary: "Take steps, facts and questions from WebVTT, whole or not at all",
    roles: ["mentor"],
    params: recordingParams,
    body: importMarkingSchema,
    response: markingViewSchema,
  },
} as const satisfies Record<string, DoorSpec>;
