import { z } from "zod";
import { CONTRACT } from "@/lib/schemas/contract/all";
import type { DoorSpec } from "@/lib/schemas/contract/door-spec";

type Json = Record<string, unknown>;

const PROBLEM: Json = {
  type: "object",
  required: ["type", "title", "status", "detail", "code"],
  properties: {
    type: { type: "string" },
    title: { type: "string" },
    status: { type: "integer" },
    detail: { type: "string", description: "A sentence for people: what happened and what to do." },
    code: { type: "string", description: "Stable, for programs." },
    problems: {
      type: "array",
      items: { type: "object", properties: { path: { type: "string" }, message: { type: "string" } } },
    },
  },
};

const jsonSchema = (schema: z.ZodType, io: "input" | "output"): Json => {
  const { $schema: _, ...rest } = z.toJSONSchema(schema, { io, unrepresentable: "any" }) as Json;
  return rest;
};

/** The whole API as an OpenAPI 3.1 document, made from the same schemas that the doors check with. */
export function openApiDocument(serverUrl: string): Json {
  const paths: Record<string, Json> = {};
  for (const [key, spec] of Object.entries(CONTRACT) as [string, DoorSpec][]) {
    const [method = "", path = ""] = key.split(" ");
    (paths[path] ??= {})[method.toLowerCase()] = operation(key, path, spec);
  }
  return {
    openapi: "3.1.0",
    info: { title: "Witnessline", version: "1", description: "Every write must carry this installation's Origin." },
    servers: [{ url: `${serverUrl}/api/v1` }],
    components: {
      schemas: { Problem: PROBLEM },
      securitySchemes: { session: { type: "apiKey", in: "cookie", name: "next-auth.session-token" } },
    },
    paths,
  };
}

function operation(key: string, path: string, spec: DoorSpec): Json {
  const query = spec.query ? ((jsonSchema(spec.query, "input").properties as Json | undefined) ?? {}) : {};
  return {
    operationId: key.replace(/[^A-Za-z]+(\w)/g, (_, letter: string) => letter.toUpperCase()).replace(/[^A-Za-z]/g, ""),
    summary: spec.summary,
    security: spec.roles === "anyone" ? [] : [{ session: [] }],
    "x-roles": spec.roles,
    parameters: [
      ...[...path.matchAll(/\{(\w+)\}/g)].map(([, name]) => ({ name, in: "path", required: true, schema: { type: "string" } })),
      ...Object.entries(query).map(([name, schema]) => ({ name, in: "query", schema })),
    ],
    ...(spec.body ? { requestBody: { required: true, content: { "application/json": { schema: jsonSchema(spec.body, "input") } } } } : {}),
    responses: {
      "200": { description: spec.summary, content: answerContent(spec) },
      default: { description: "Refused", content: { "application/problem+json": { schema: { $ref: "#/components/schemas/Problem" } } } },
    },
  };
}

function answerContent(spec: DoorSpec): Json {
  if ("file" in spec.response) return { [spec.response.file]: { schema: { type: "string" } } };
  return { "application/json": { schema: jsonSchema(spec.response, "output") } };
}
