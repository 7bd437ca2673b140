import { z } from "zod";
import type { DoorSpec } from "@/lib/schemas/contract/door-spec";
import { giveModuleSchema, moduleDraftSchema, newModuleSchema, publishModuleSchema } from "@/lib/schemas/modules";

const moduleParams = z.object({ org: z.string(), moduleId: z.uuid() });

/** Doors of modules: drafting, publishing, giving them to apprentices. */
export const modulesDoors = {
  "POST /orgs/{org}/modules": {
    summary: "Begin a module, from a recording's steps or empty",
    roles: ["mentor"],
    params: z.object({ org: z.string() }),
    body: newModuleSchema,
    response: z.object({ moduleId: z.uuid() }),
  },
  "PUT /orgs/{org}/modules/{moduleId}": {
    summary: "Save a module's draft",
    roles: ["mentor"],
    params: moduleParams,
    body: moduleDraftSchema,
    response: z.object({ version: z.int() }),
  },
  "POST /orgs/{org}/modules/{moduleId}/revisions": {
    summary: "Publish the draft as a frozen revision",
    roles: ["mentor"],
    params: moduleParams,
    body: publishModuleSchema,
    response: z.object({ number: z.int(), contentHash: z.string() }),
  },
  "POST /orgs/{org}/modules/{moduleId}/assignments": {
    summary: "Give the newest revision to apprentices, with a date",
    roles: ["mentor"],
    params: moduleParams,
    body: giveModuleSchema,
    response: z.object({ given: z.int() }),
  },
} as const satisfies Record<string, DoorSpec>;
