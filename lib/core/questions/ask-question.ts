import type { AskedQuestion, GivenAnswer, Question } from "@/lib/core/questions/types";

/** From an attempt's random ids to the question's own. Stays on the server. */
export type IdMap = Record<string, string>;

/** A source of chance, given by the caller so that this stays pure: fresh ids, and numbers in [0, 1). */
export type Chance = { id: () => string; number: () => number };

/** Fisher–Yates. */
function shuffled<T>(items: readonly T[], chance: Chance): T[] {
  const result = [...items];
  for (let i = result.length - 1; i > 0; i -= 1) {
    const j = Math.floor(chance.number() * (i + 1));
    [result[i], result[j]] = [result[j] as T, result[i] as T];
  }
  return result;
}

/**
 * What an apprentice is asked: the prompt and the choices under random ids in random order, nothing that says which is right. An
 * order never comes already solved where there is another.
 */
export function askQuestion(question: Question, attemptId: string, chance: Chance): { asked: AskedQuestion; idMap: IdMap } {
  const { body } = question;
  const idMap: IdMap = {};
  const hide = (items: readonly { id: string; text: string }[]) =>
    items.map(({ id, text }) => {
      const hidden = chance.id();
      idMap[hidden] = id;
      return { id: hidden, text };
    });
  const base = { attemptId, questionId: question.id, prompt: question.prompt, safetyCritical: question.safetyCritical };
  if (body.kind === "number") return { asked: { ...base, ask: { kind: "number", unit: body.unit } }, idMap };
  if (body.kind === "one_of") {
    return { asked: { ...base, ask: { kind: "one_of", choices: hide(shuffled(body.choices, chance)) } }, idMap };
  }
  const order = shuffled(body.items, chance);
  const solved = order.every((item, position) => item.id === body.items[position]?.id);
  const mixed = solved ? [...order.slice(1), ...order.slice(0, 1)] : order;
  return { asked: { ...base, ask: { kind: "put_in_order", items: hide(mixed) } }, idMap };
}

/** An answer with the attempt's ids turned back into the question's; undefined where an id is not one of this attempt. */
export function unmapAnswer(given: GivenAnswer, idMap: IdMap): GivenAnswer | undefined {
  const own = (id: string) => (Object.hasOwn(idMap, id) ? idMap[id] : undefined);
  if (given.kind === "number") return given;
  if (given.kind === "one_of") {
    const choiceId = own(given.choiceId);
    return choiceId === undefined ? undefined : { kind: "one_of", choiceId };
  }
  const itemIds = given.itemIds.map(own);
  return itemIds.every((id) => id !== undefined) ? { kind: "put_in_order", itemIds } : undefined;
}
