/** Every act of the bench by its key, in the order of the sheet. */
export const BENCH_KEYS = [
  { about: "The film", keys: ["Space", "K"], words: "play or pause" },
  { about: "The film", keys: ["J"], words: "back five seconds; held: backwards fast" },
  { about: "The film", keys: ["L"], words: "on five seconds; held: forwards fast, then faster" },
  { about: "The film", keys: ["←", "→"], words: "a second back, a second on" },
  { about: "The film", keys: [",", "."], words: "a picture back, a picture on" },
  { about: "The film", keys: ["Home", "End"], words: "to the beginning, to the end" },
  { about: "Steps", keys: ["[", "]"], words: "the step before, the step after" },
  { about: "Steps", keys: ["N"], words: "new step from here" },
  { about: "Steps", keys: ["S"], words: "split the step here" },
  { about: "Steps", keys: ["I"], words: "the step begins here" },
  { about: "Steps", keys: ["O"], words: "the step ends here" },
  { about: "Steps", keys: ["M"], words: "join with the next step" },
  { about: "Steps", keys: ["Tab", "←", "→"], words: "on an edge: move it by a picture; with Shift by a second" },
  { about: "Questions", keys: ["Q"], words: "question here" },
  { about: "All", keys: ["Delete"], words: "remove the step or question that is chosen" },
  { about: "All", keys: ["Ctrl Z"], words: "undo; with Shift redo" },
  { about: "All", keys: ["?"], words: "this sheet" },
] as const;

const TYPED_INTO = new Set(["text", "number", "search", "url", "email", "tel", "date", "time", "file"]);

/** Keys must not act while somebody types, chooses from a list, or looks at a sheet that lies on top. */
export function isTyping(target: EventTarget | null): boolean {
  if (!(target instanceof HTMLElement)) return false;
  if (target.isContentEditable || target.closest("dialog") !== null) return true;
  if (target instanceof HTMLInputElement) return TYPED_INTO.has(target.type);
  return target instanceof HTMLTextAreaElement || target instanceof HTMLSelectElement;
}
