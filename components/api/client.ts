import type { DoorAnswer, DoorBodyIn, DoorKey, DoorQueryIn } from "@/lib/schemas/contract/all";
import type { FieldProblem } from "@/lib/core/errors";

/** What the server said when it refused: a sentence to show, a code for programs, and the fields it is about. */
export class ApiProblem extends Error {
  readonly status: number;
  readonly code: string;
  readonly problems: FieldProblem[];

  constructor(status: number, code: string, detail: string, problems: FieldProblem[]) {
    super(detail);
    this.name = "ApiProblem";
    this.status = status;
    this.code = code;
    this.problems = problems;
  }
}

type Names<Path extends string> = Path extends `${string}{${infer Name}}${infer Rest}` ? Name | Names<Rest> : never;

type Call<K extends DoorKey> = { params: Record<Names<K>, string>; signal?: AbortSignal } & (DoorBodyIn<K> extends undefined
  ? { body?: undefined }
  : { body: DoorBodyIn<K> }) &
  (DoorQueryIn<K> extends undefined ? { query?: undefined } : { query?: DoorQueryIn<K> });

/** Address of a door with its parameters filled in, for links and downloads. */
export function doorPath<K extends DoorKey>(key: K, params: Record<Names<K>, string>): string {
  const path = key.slice(key.indexOf(" ") + 1);
  return `/api/v1${path.replace(/\{(\w+)\}/g, (_, name: string) => encodeURIComponent((params as Record<string, string>)[name] ?? ""))}`;
}

/**
 * Calls one door of the API. Types come from the contract; no schema is shipped to the browser, the server is the judge.
 * @throws ApiProblem when the server refuses; ApiProblem with status 0 and code "offline" when it can't be reached.
 */
export async function api<K extends DoorKey>(key: K, call: Call<K>): Promise<DoorAnswer<K>> {
  const method = key.slice(0, key.indexOf(" "));
  const search = call.query ? `?${new URLSearchParams(call.query as Record<string, string>)}` : "";
  const response = await fetch(`${doorPath(key, call.params)}${search}`, {
    method,
    ...(call.body === undefined ? {} : { body: JSON.stringify(call.body), headers: { "content-type": "application/json" } }),
    ...(call.signal ? { signal: call.signal } : {}),
  }).catch((error: unknown) => {
    if (error instanceof DOMException && error.name === "AbortError") throw error;
    throw new ApiProblem(0, "offline", "The connection is down. What you typed is still here; try again when it is back.", []);
  });
  if (!response.ok) throw await problemFrom(response);
  if (response.headers.get("content-type")?.startsWith("application/json")) return (await response.json()) as DoorAnswer<K>;
  return response as DoorAnswer<K>;
}

async function problemFrom(response: Response): Promise<ApiProblem> {
  const body = (await response.json().catch(() => ({}))) as { code?: string; detail?: string; problems?: FieldProblem[] };
  const sentence = body.detail ?? "Something went wrong on our side. Nothing was changed; try again in a minute.";
  return new ApiProblem(response.status, body.code ?? "unexpected", sentence, body.problems ?? []);
}
