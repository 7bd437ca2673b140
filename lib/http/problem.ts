import { STATUS_CODES } from "node:http";
import { z } from "zod";
import { APP_ERROR_STATUS, AppError, type FieldProblem } from "@/lib/core/errors";

/** An RFC 9457 problem details answer. `code` is stable and for programs, `detail` is a sentence for people. */
export function problem(status: number, code: string, detail: string, problems: FieldProblem[] = []): Response {
  const body = { type: "about:blank", title: STATUS_CODES[status] ?? "Error", status, detail, code, problems };
  return Response.json(body, {
    status,
    headers: { "content-type": "application/problem+json", "cache-control": "no-store" },
  });
}

/** Turns what we expect into an answer and lets everything else through: that is a bug, and the log must see it. */
export function problemOf(error: unknown): Response {
  if (error instanceof AppError) {
    return problem(APP_ERROR_STATUS[error.code], error.code, error.message, error.problems);
  }
  if (error instanceof z.ZodError) {
    const problems = error.issues.map((issue) => ({ path: issue.path.join("."), message: issue.message }));
    return problem(400, "invalid_input", "Some of what was sent is missing or wrong. Nothing was changed.", problems);
  }
  throw error;
}
