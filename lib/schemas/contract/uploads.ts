import { z } from "zod";
import type { DoorSpec } from "@/lib/schemas/contract/door-spec";
import { completedUploadSchema, partNumbersSchema, startUploadSchema, uploadSchema } from "@/lib/schemas/uploads";

const uploadParams = z.object({ org: z.string(), uploadId: z.uuid() });
const SENDERS = ["mentor", "apprentice"] as const;

/** Doors of uploads. The bytes themselves go from the browser straight to the store. */
export const uploadsDoors = {
  "POST /orgs/{org}/uploads": {
    summary: "Start to send a file, or go on with the same file where it stopped: a mentor a recording, an apprentice evidence",
    roles: SENDERS,
    params: z.object({ org: z.string() }),
    body: startUploadSchema,
    response: uploadSchema,
  },
  "GET /orgs/{org}/uploads": {
    summary: "One's own uploads that are not finished",
    roles: SENDERS,
    params: z.object({ org: z.string() }),
    response: z.object({ uploads: z.array(uploadSchema.omit({ receivedParts: true, receivedBytes: true })) }),
  },
  "GET /orgs/{org}/uploads/{uploadId}": {
    summary: "How far an upload of one's own is: which parts the store has",
    roles: SENDERS,
    params: uploadParams,
    response: uploadSchema,
  },
  "POST /orgs/{org}/uploads/{uploadId}/part-addresses": {
    summary: "Addresses in the store to which parts of the file may be sent, good for an hour",
    roles: SENDERS,
    params: uploadParams,
    body: partNumbersSchema,
    response: z.object({ parts: z.array(z.object({ partNumber: z.int(), url: z.string() })) }),
  },
  "POST /orgs/{org}/uploads/{uploadId}/completion": {
    summary: "Put the parts together and check them; asked twice, the answer is the same",
    roles: SENDERS,
    params: uploadParams,
    response: completedUploadSchema,
  },
  "DELETE /orgs/{org}/uploads/{uploadId}": {
    summary: "Give up an upload of one's own; what has arrived is thrown away",
    roles: SENDERS,
    params: uploadParams,
    response: z.object({ cancelled: z.literal(true) }),
  },
} as const satisfies Record<string, DoorSpec>;
