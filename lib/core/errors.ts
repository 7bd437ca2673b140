/** Stable codes of the failures that we expect. `code` is for programs, the message is a sentence for people. */
export const APP_ERROR_STATUS = {
  invalid_input: 400,
  unauthenticated: 401,
  forbidden: 403,
  not_found: 404,
  conflict: 409,
  gone: 410,
  too_large: 413,
  too_many: 429,
  unavailable: 503,
} as const;

export type AppErrorCode = keyof typeof APP_ERROR_STATUS;

/** One problem with one field or line of what was sent. */
export type FieldProblem = { path: string; message: string };

/** An expected failure: what happened and what to do, said to the person. Anything else that is thrown is a bug. */
export class AppError extends Error {
  readonly code: AppErrorCode;
  readonly problems: FieldProblem[];

  constructor(code: AppErrorCode, message: string, problems: FieldProblem[] = []) {
    super(message);
    this.name = "AppError";
    this.code = code;
    this.problems = problems;
  }
}
