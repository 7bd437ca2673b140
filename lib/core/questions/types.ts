/** One choice of a "one of" question; exactly one of them is right. `why` says why this choice is right or wrong. */
export type Choice = { id: string; text: string; right: boolean; why: string };

export type OneOfBody = { kind: "one_of"; choices: Choice[] };

/** Right when |given − value| ≤ tolerance after conversion to `unit` (a key of the unit table). `slips` name wrong values we know the cause of. */
export type NumberBody = {
  kind: "number";
  unit: string;
  value: number;
  tolerance: number;
  slips: { value: number; hint: string }[];
};

/** `items` in the right order. `neverBefore` lists pairs [x, y] of item ids: x done before y can hurt someone, so it is never right. */
export type PutInOrderBody = { kind: "put_in_order"; items: { id: string; text: string }[]; neverBefore: [string, string][] };

export type QuestionBody = OneOfBody | NumberBody | PutInOrderBody;
export type QuestionKind = QuestionBody["kind"];
export const QUESTION_KINDS = ["one_of", "number", "put_in_order"] as const satisfies readonly QuestionKind[];

/** A step question, with its answer: never sent to an apprentice before the answer is given. Times in ms on the recording's axis. */
export type Question = {
  id: string;
  stepId: string;
  atMs: number;
  prompt: string;
  explanation: string;
  lookAgainMs: number;
  safetyCritical: boolean;
  body: QuestionBody;
};

/** What an apprentice's browser may hold of a question. Ids are random and belong to one attempt. */
export type AskedQuestion = {
  attemptId: string;
  questionId: string;
  prompt: string;
  safetyCritical: boolean;
  ask:
    | { kind: "one_of"; choices: { id: string; text: string }[] }
    | { kind: "number"; unit: string }
    | { kind: "put_in_order"; items: { id: string; text: string }[] };
};

/** What an apprentice gives. `ids` are the attempt's own. */
export type GivenAnswer =
  | { kind: "one_of"; choiceId: string }
  | { kind: "number"; value: number; unit: string }
  | { kind: "put_in_order"; itemIds: string[] };

/** What the server says of an answer. `diagnosis` names a known slip (unit, factor of ten, nominal for limit …), else null. */
export type Marked = { right: boolean; diagnosis: string | null };
