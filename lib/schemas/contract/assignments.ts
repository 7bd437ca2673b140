import { z } from "zod";
import {
  answerQuestionSchema,
  askedQuestionSchema,
  learningProgressSchema,
  markedAnswerSchema,
  reportSpansSchema,
} from "@/lib/schemas/assignments";
import type { DoorSpec } from "@/lib/schemas/contract/door-spec";
import { mediaSchema } from "@/lib/schemas/media";

const assignmentParams = z.object({ org: z.string(), assignmentId: z.uuid() });

/** Doors of learning a module that was given to one: playing, being asked, answering. */
export const assignmentsDoors = {
  "GET /orgs/{org}/assignments/{assignmentId}/media": {
    summary: "Signed addresses of the films of a module, to play or to renew",
    roles: ["apprentice"],
    params: assignmentParams,
    response: z.object({ media: z.array(mediaSchema) }),
  },
  "GET /orgs/{org}/assignments/{assignmentId}/questions.vtt": {
    summary: "When questions come in a recording, as a metadata track without their answers",
    roles: ["apprentice"],
    params: assignmentParams,
    query: z.object({ recordingId: z.uuid() }),
    response: { file: "text/vtt" },
  },
  "POST /orgs/{org}/assignments/{assignmentId}/spans": {
    summary: "Report what was played; the server says what it accepts",
    roles: ["apprentice"],
    params: assignmentParams,
    body: reportSpansSchema,
    response: learningProgressSchema,
  },
  "POST /orgs/{org}/assignments/{assignmentId}/attempts": {
    summary: "Be asked a question, with ids that belong to this attempt only",
    roles: ["apprentice"],
    params: assignmentParams,
    body: z.object({ questionId: z.uuid() }),
    response: askedQuestionSchema,
  },
  "POST /orgs/{org}/assignments/{assignmentId}/answers": {
    summary: "Answer an attempt, once",
    roles: ["apprentice"],
    params: assignmentParams,
    body: answerQuestionSchema,
    response: markedAnswerSchema,
  },
} as const satisfies Record<string, DoorSpec>;
