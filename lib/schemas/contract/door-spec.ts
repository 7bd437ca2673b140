import type { z } from "zod";
import type { Role } from "@/lib/core/roles";

/** A door that answers with a file instead of JSON. */
export type FileAnswer = { file: "text/vtt" | "text/csv" | "application/json" };

/**
 * What one door of the API takes and gives. The wrapper, the typed client, the OpenAPI document and the test matrix all read this.
 * `roles`: "anyone", "signed_in", or the roles at the organisation in the address that may come in at all (the service decides the rest).
 * `response` strips every field that it does not name, so nothing leaves that was not meant to.
 */
export type DoorSpec = {
  summary: string;
  roles: "anyone" | "signed_in" | readonly Role[];
  params?: z.ZodObject;
  query?: z.ZodObject;
  body?: z.ZodType;
  response: z.ZodType | FileAnswer;
};
