import { COMMON_PASSWORDS } from "@/lib/core/passwords/common-passwords";

/** Characters, counted as Unicode code points. */
export const PASSWORD_MIN_LENGTH = 15;
const PASSWORD_MAX_LENGTH = 1000;

/**
 * Why a password can't be taken, as a sentence for the person who chose it; undefined when it can.
 * No rule says which kinds of character it must hold. It is refused when the whole of it is a common password or the person's own words,
 * or is put together from two of them ("password12345678", "ana ana ana ana ana"); a common word among others does no harm.
 *
 * @param near  what is near to the person: name, address, organisation.
 * @source      NIST SP 800-63B-4, 3.1.1.2: at least 15 characters where the password is the only factor, 64 or more permitted, one code
 *              point one character, no composition rules, the whole password compared with a list of common, expected or context words.
 */
export function passwordProblem(password: string, near: readonly string[] = []): string | undefined {
  const typed = password.normalize("NFKC");
  const length = [...typed].length;
  if (length < PASSWORD_MIN_LENGTH) return `Use at least ${PASSWORD_MIN_LENGTH} characters; this has ${length}.`;
  if (length > PASSWORD_MAX_LENGTH) return `Use at most ${PASSWORD_MAX_LENGTH} characters.`;
  const text = reduce(typed);
  if (isMadeOf(text, wordsOf(near))) return "This is made of your own name, address or organisation. Choose words that have nothing to do with you.";
  if (isMadeOf(text, [...COMMON_PASSWORDS, ...wordsOf(near)])) {
    return "This is one of the passwords that are tried first. Choose words that have nothing to do with each other.";
  }
  return undefined;
}

/** Small letters and digits: "P@ssword, Password!" is still the same two words to somebody who guesses, save for the sign. */
const reduce = (text: string): string => text.normalize("NFKC").toLowerCase().replace(/[^\p{L}\p{N}]/gu, "");

/** Each text as a whole and each of its words, where a word is more than an initial. */
function wordsOf(near: readonly string[]): string[] {
  const words = near.flatMap((text) => [text, ...text.split(/[^\p{L}\p{N}]+/u)]).map(reduce);
  return words.filter((word) => word.length >= 3);
}

/** Whether all of `text` is one or two of `words`, each as often as one likes. */
function isMadeOf(text: string, words: readonly string[]): boolean {
  const present = [...new Set(words)].filter((word) => text.includes(word));
  return present.some((first, index) => text.startsWith(first) && present.some((second, other) => canCut(text, index === other ? [first] : [first, second])));
}

function canCut(text: string, pieces: readonly string[]): boolean {
  const reachable = new Set([0]);
  // A set is walked in the order in which places are found, and places found on the way are walked too.
  for (const at of reachable) {
    for (const piece of pieces) if (text.startsWith(piece, at)) reachable.add(at + piece.length);
  }
  return text.length > 0 && reachable.has(text.length);
}
