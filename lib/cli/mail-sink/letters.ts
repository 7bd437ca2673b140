import { mkdirSync, readdirSync, readFileSync, renameSync, writeFileSync } from "node:fs";
import { join } from "node:path";
import { simpleParser, type AddressObject } from "mailparser";
import { z } from "zod";

const letterSchema = z.object({
  id: z.string(),
  receivedAt: z.string(),
  from: z.string(),
  to: z.array(z.string()),
  subject: z.string(),
  text: z.string(),
});

/** A letter that was sent to somebody and kept here instead. */
export type KeptLetter = z.infer<typeof letterSchema>;

const addressesOf = (field: AddressObject | AddressObject[] | undefined): string[] =>
  [field ?? []].flat().flatMap((part) => part.value.map((entry) => entry.address ?? entry.name));

/** The letters in a folder, newest first; each is a JSON file beside the bytes as they came in. */
export class LetterBox {
  #letters: KeptLetter[];

  constructor(private readonly folder: string) {
    mkdirSync(folder, { recursive: true });
    this.#letters = readdirSync(folder)
      .filter((name) => name.endsWith(".json"))
      .sort()
      .map((name) => letterSchema.parse(JSON.parse(readFileSync(join(folder, name), "utf8"))));
  }

  /** Keeps one message. `recipients` are those of the envelope, which is where it would have gone. */
  async keep(source: Buffer, recipients: string[], now = new Date()): Promise<KeptLetter> {
    const parsed = await simpleParser(source);
    const letter: KeptLetter = {
      id: `${now.toISOString().replace(/\D/g, "")}-${String(this.#letters.length + 1).padStart(6, "0")}`,
      receivedAt: now.toISOString(),
      from: addressesOf(parsed.from)[0] ?? "",
      to: recipients,
      subject: parsed.subject ?? "",
      text: parsed.text ?? "",
    };
    this.#letters.push(letter);
    writeFileSync(join(this.folder, `${letter.id}.eml`), source);
    const path = join(this.folder, `${letter.id}.json`);
    writeFileSync(`${path}.new`, JSON.stringify(letter)); // renamed when whole, so that a start after a crash finds no half letter
    renameSync(`${path}.new`, path);
    return letter;
  }

  /** Newest first; those to one address when it is given. */
  list(to?: string): KeptLetter[] {
    const wanted = to?.toLowerCase();
    return this.#letters.filter((letter) => !wanted || letter.to.some((address) => address.toLowerCase() === wanted)).toReversed();
  }

  find(id: string): KeptLetter | undefined {
    return this.#letters.find((letter) => letter.id === id);
  }
}
