import { Told } from "./told.mjs";

/**
 * Reads a command's words against those it knows.
 * @template {string} Word
 * @param {string[]} given
 * @param {readonly Word[]} known
 * @returns {Set<Word>}
 */
export function readWords(given, known) {
  for (const word of given) {
    if (!known.includes(word)) throw new Told(`"${word}" is not known here. Known: ${known.join(", ")}.`);
  }
  return new Set(given);
}

/**
 * The port a person asked for by PORT, if any.
 * @param {string | undefined} text
 */
export function readWishedPort(text) {
  if (!text) return undefined;
  const port = Number(text);
  if (!Number.isInteger(port) || port < 1 || port > 65_535) throw new Told(`PORT is "${text}"; it must be a number from 1 to 65535.`);
  return port;
}
