/** What lies on the bench to be worked on: a step, a question, or nothing. */
export type Chosen = { kind: "step" | "question"; id: string } | null;
