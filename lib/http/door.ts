import "server-only";
import { z } from "zod";
import { findActor, findSignedIn } from "@/lib/auth/actor";
import { AppError } from "@/lib/core/errors";
import type { Actor, SignedIn } from "@/lib/core/roles";
import { env } from "@/lib/env";
import { assertSameOrigin } from "@/lib/http/origin";
import { problemOf } from "@/lib/http/problem";
import { readJson } from "@/lib/http/read-json";
import { CONTRACT, type Contract, type DoorBody, type DoorKey, type DoorParams, type DoorQuery, type DoorResult } from "@/lib/schemas/contract/all";
import type { DoorSpec } from "@/lib/schemas/contract/door-spec";

/** Who is at the door: a member where roles are asked for, somebody signed in, or perhaps nobody. */
type Caller<K extends DoorKey> = Contract[K]["roles"] extends "anyone"
  ? SignedIn | null
  : Contract[K]["roles"] extends "signed_in"
    ? SignedIn
    : Actor;

export type DoorCall<K extends DoorKey> = {
  actor: Caller<K>;
  params: DoorParams<K>;
  query: DoorQuery<K>;
  body: DoorBody<K>;
  request: Request;
};

type RouteHandler = (request: Request, context: { params: Promise<Record<string, string | string[] | undefined>> }) => Promise<Response>;

/**
 * The one wrapper that every route handler goes through: who is calling, may they come in, does the request come from our pages,
 * is what they send well formed; then the service; then an answer stripped to its schema. Known errors become problem+json.
 * @param key  the door's row in the contract, "METHOD /path"
 * @param run  hands over to a service, which checks what only it can know
 */
export function door<K extends DoorKey>(key: K, run: (call: DoorCall<K>) => Promise<DoorResult<K>>): RouteHandler {
  const spec: DoorSpec = CONTRACT[key];
  return async (request, context) => {
    try {
      assertSameOrigin(request, env().APP_URL);
      // A route without a name in its address gets no parameters at all.
      const raw = (await context.params) ?? {};
      const actor = await callerOf(spec, raw.org);
      const params = spec.params ? parseAddress(spec.params, raw) : undefined;
      const query = spec.query?.parse(Object.fromEntries(new URL(request.url).searchParams));
      const body = spec.body?.parse(await readJson(request));
      const result = await run({ actor, params, query, body, request } as DoorCall<K>);
      if (result instanceof Response) return result;
      const answer = (spec.response as z.ZodType).parse(result);
      return Response.json(answer, { headers: { "cache-control": "no-store" } });
    } catch (error) {
      return problemOf(error);
    }
  };
}

/** An id in the address that can't be one is an address that isn't there. */
function parseAddress(schema: z.ZodObject, raw: Record<string, unknown>): unknown {
  const result = schema.safeParse(raw);
  if (!result.success) throw new AppError("not_found", "There is nothing at this address.");
  return result.data;
}

async function callerOf(spec: DoorSpec, org: string | string[] | undefined): Promise<SignedIn | Actor | null> {
  const signedIn = await findSignedIn();
  if (spec.roles === "anyone") return signedIn ?? null;
  if (!signedIn) throw new AppError("unauthenticated", "Sign in first. Nothing was lost.");
  if (spec.roles === "signed_in") return signedIn;
  const actor = typeof org === "string" ? await findActor(signedIn, org) : undefined;
  // To somebody from outside, an organisation that is not theirs looks like one that does not exist.
  if (!actor) throw new AppError("not_found", "There is nothing at this address.");
  if (!spec.roles.some((role) => actor.roles.has(role))) {
    throw new AppError("forbidden", `At ${actor.organisation.name} this needs another role: ${spec.roles.join(" or ")}.`);
  }
  return actor;
}
