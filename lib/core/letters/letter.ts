/** A letter ready for the outbox. Plain text; one paragraph per entry. `dedupeKey`: a second letter with the same key is not written. */
export type Letter = { to: string; subject: string; paragraphs: string[]; dedupeKey?: string };

/** The letter's text as it is sent. */
export function letterBody(letter: Letter): string {
  return `${letter.paragraphs.join("\n\n")}\n\n— Witnessline\n`;
}
