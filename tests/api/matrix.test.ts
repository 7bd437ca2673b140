import { beforeAll, describe, expect, test, vi } from "vitest";
import type { z } from "zod";
import { getDb } from "@/db/client";
import { startSession } from "@/db/queries/sessions";
import { CONTRACT, type DoorKey } from "@/lib/schemas/contract/all";
import type { DoorSpec } from "@/lib/schemas/contract/door-spec";
import { apiWorld, CALLERS, type Caller, type World } from "../support/api-world";
import { testDatabase } from "../support/database";
import { filesBelow } from "../support/files";
import { testStore } from "../support/store";
import { DOORS, PAGES } from "./matrix";
import type { Answer, Row, Sent } from "./rows";

// Only the cookie is made up. The session's row, the person and the roles come from the database by the code that always does it.
const cookie = vi.hoisted(() => ({ sessionId: undefined as string | undefined }));
vi.mock("next-auth", () => ({ default: () => () => new Response(), getServerSession: async () => (cookie.sessionId ? { sessionId: cookie.sessionId } : null) }));
vi.mock("next/headers", () => ({ cookies: async () => new Map(), headers: async () => new Headers() }));

const { owner } = testDatabase();
testStore();
let world: World;
beforeAll(async () => {
  world = await apiWorld(owner());
});

type Handler = (request: Request, context: { params: Promise<Record<string, string>> }) => Promise<Response>;
const METHODS = ["GET", "POST", "PUT", "PATCH", "DELETE"] as const;
const doorPath = (file: string): string => file.replace(/^app\/api\/v1/, "").replace(/\/route\.ts$/, "").replaceAll("[", "{").replaceAll("]", "}");
const pagePath = (file: string): string => file.replace(/^app/, "").replace(/\/page\.tsx$/, "").replace(/\/\([^)]+\)/g, "") || "/";

// The sign-in library answers below /api/auth by itself; tests/services/accounts/sign-in.test.ts holds what we give it.
const routeFiles = filesBelow("app", /\/route\.ts$/).filter((file) => !file.startsWith("app/api/auth/"));
const pageFiles = filesBelow("app", /\/page\.tsx$/);
const handlers = new Map<string, Handler>();
const pages = new Map(pageFiles.map((file) => [pagePath(file), file]));
for (const file of routeFiles) {
  const module = (await import(`../../${file}`)) as Record<string, Handler>;
  for (const method of METHODS) if (module[method]) handlers.set(`${method} ${doorPath(file)}`, module[method]);
}

test("every route, every door of the contract and every row of the matrix are the same list", () => {
  expect([...handlers.keys()].toSorted()).toEqual(Object.keys(DOORS).toSorted());
  expect(Object.keys(CONTRACT).toSorted()).toEqual(Object.keys(DOORS).toSorted());
});

test("every page has a row and every row a page", () => {
  expect([...pages.keys()].toSorted()).toEqual(Object.keys(PAGES).toSorted());
});

async function signIn(row: Row, caller: Caller): Promise<void> {
  const actor = world.at(row.at, caller);
  cookie.sessionId = actor ? await startSession(getDb(), { personId: actor.personId, device: "test", days: 1 }) : undefined;
}

function call(key: string, org: string, sent: Sent, origin: string | null = "http://app.test"): Promise<Response> {
  const [method = "", path = ""] = key.split(" ");
  const params: Record<string, string> = { ...(path.includes("{org}") ? { org } : {}), ...sent.params };
  const address = new URL(`/api/v1${path.replace(/\{(\w+)\}/g, (_, name: string) => params[name] ?? "")}?${new URLSearchParams(sent.query)}`, "http://app.test");
  const headers = { ...(origin === null ? {} : { origin }), ...(sent.body === undefined ? {} : { "content-type": "application/json" }) };
  const request = new Request(address, { method, headers, ...(sent.body === undefined ? {} : { body: JSON.stringify(sent.body) }) });
  return (handlers.get(key) as Handler)(request, { params: Promise.resolve(params) });
}

describe.each(Object.entries(DOORS))("%s", (key, row) => {
  const spec: DoorSpec = CONTRACT[key as DoorKey];

  test.each(CALLERS)("%s", async (caller) => {
    const sent = await row.send(world, world.at(row.at, caller));
    await signIn(row, caller);
    const response = await call(key, world.orgs[row.at].slug, sent);
    const text = await response.text();
    expect(response.status, text.slice(0, 400)).toBe(row.gives[caller]);
    if (response.status !== 200) expect(response.headers.get("content-type")).toBe("application/problem+json");
    else if ("file" in spec.response) expect(response.headers.get("content-type")).toContain(spec.response.file);
    // Parsing strips what the schema doesn't name: nothing may have been there to strip.
    else expect((spec.response as z.ZodType).parse(JSON.parse(text))).toEqual(JSON.parse(text));
  });

  test.runIf(!key.startsWith("GET "))("a write from no page of ours is refused", async () => {
    const caller = CALLERS.find((one) => row.gives[one] === 200) as Caller;
    const sent = await row.send(world, world.at(row.at, caller));
    await signIn(row, caller);
    for (const origin of [null, "https://elsewhere.test", "null"]) {
      expect((await call(key, world.orgs[row.at].slug, sent, origin)).status, String(origin)).toBe(403);
    }
  });

  test.runIf(/\{org\}.*\{/.test(key))("another organisation's id at one's own address isn't there", async () => {
    const outsider = world.at(row.at, "outsider");
    const sent = await row.send(world, outsider);
    await world.resetPassword(outsider);
    await signIn(row, "outsider");
    const response = await call(key, outsider?.organisation.slug ?? "", sent);
    expect([403, 404], await response.text()).toContain(response.status);
  });
});

async function open(path: string, params: Record<string, unknown>): Promise<Answer> {
  const module = (await import(`../../${pages.get(path)}`)) as { default: (props: object) => Promise<unknown> };
  try {
    await module.default({ params: Promise.resolve(params), searchParams: Promise.resolve({}) });
    return 200;
  } catch (error) {
    const digest = String((error as { digest?: string }).digest);
    if (digest.startsWith("NEXT_REDIRECT")) return "redirect";
    if (digest === "NEXT_HTTP_ERROR_FALLBACK;404") return 404;
    throw error;
  }
}

describe.each(Object.entries(PAGES))("page %s", (path, row) => {
  test.each(CALLERS)("%s", async (caller) => {
    const actor = world.at(row.at, caller);
    const sent = await row.send(world, actor);
    await signIn(row, caller);
    expect(await open(path, { org: world.orgs[row.at].slug, missing: ["nowhere"], ...sent.params })).toBe(row.gives[caller]);
  });

  test.runIf(/\[org\].*Id\]/.test(path))("another organisation's id at one's own address isn't there", async () => {
    const outsider = world.at(row.at, "outsider");
    const sent = await row.send(world, outsider);
    await signIn(row, "outsider");
    expect(await open(path, { org: outsider?.organisation.slug, ...sent.params })).toBe(404);
  });
});
