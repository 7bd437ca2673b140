import { ApiProblem } from "@/components/api/client";

/** What a form shows after it was refused: a sentence, and a sentence beside each field that it is about. */
export type Refusal = { sentence: string; code: string; fields: Record<string, string> };

/** @throws whatever is no refusal of the server: that is a bug, and the error page must see it */
export function refusalOf(error: unknown): Refusal {
  if (!(error instanceof ApiProblem)) throw error;
  // "person.password" is the field "password" of the form.
  const fields = error.problems.map(({ path, message }) => [path.split(".").at(-1) ?? path, message] as const);
  return { sentence: error.message, code: error.code, fields: Object.fromEntries(fields) };
}

/** Reads one text field of a form that was sent. */
export const textOf = (form: FormData, name: string): string => String(form.get(name) ?? "");
