/** Every act of the bench by its key, in the order of the sheet. */
export const BENCH_KEYS = [
  { key: "Space", also: "k", words: "play or pause" },
  { key: "J", also: null, words: "back five seconds" },
  { key: "L", also: null, words: "on five seconds" },
  { key: "←", also: "ArrowLeft", words: "back a second" },
  { key: "→", also: "ArrowRight", words: "on a second" },
  { key: ",", also: null, words: "back a picture" },
  { key: ".", also: null, words: "on a picture" },
  { key: "[", also: null, words: "step before" },
  { key: "]", also: null, words: "step after" },
  { key: "N", also: null, words: "new step from here" },
  { key: "S", also: null, words: "split the step here" },
  { key: "I", also: null, words: "step begins here" },
  { key: "O", also: null, words: "step ends here" },
  { key: "M", also: null, words: "join with the next step" },
  { key: "Q", also: null, words: "question here" },
  { key: "Delete", also: null, words: "remove what is chosen" },
  { key: "Ctrl Z", also: null, words: "undo" },
  { key: "Ctrl Shift Z", also: null, words: "redo" },
  { key: "?", also: null, words: "this sheet" },
] as const;

/** Keys must not act while somebody types or works a control that has the same key. */
export function isTyping(target: EventTarget | null): boolean {
  return target instanceof HTMLElement && (target.isContentEditable || /^(INPUT|TEXTAREA|SELECT|DIALOG)$/.test(target.tagName) || target.closest("dialog") !== null);
}
