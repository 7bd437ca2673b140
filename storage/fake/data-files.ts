import { randomUUID } from "node:crypto";
import { createReadStream } from "node:fs";
import { mkdir, open, readdir, rm, stat } from "node:fs/promises";
import { join } from "node:path";

/** A run of an object's bytes: a file that is never changed once written. An object has one, or one for each part. */
export type Piece = { file: string; sizeBytes: number };

const BATCH_BYTES = 1024 * 1024;
const READ_BYTES = 512 * 1024;
const ORPHAN_AGE_MS = 24 * 3_600_000;

/** The folder of bytes of one bucket. Files have random names: which object they belong to is said by the records. */
export class DataFiles {
  readonly #directory: string;
  readonly #readers = new Map<string, number>();
  readonly #doomed = new Set<string>();

  constructor(directory: string) {
    this.#directory = directory;
  }

  /**
   * Writes a stream to a new file and waits until it is on the disk. One megabyte is written while the next is
   * read and hashed, so memory stays flat. If the stream fails, the file goes away again.
   */
  async write(chunks: AsyncIterable<Buffer>): Promise<Piece> {
    const file = randomUUID();
    const path = join(this.#directory, file);
    const handle = await open(path, "wx");
    let sizeBytes = 0;
    let writing: Promise<unknown> = Promise.resolve();
    try {
      let batch: Buffer[] = [];
      let held = 0;
      const flush = async () => {
        await writing;
        const [ready, position] = [batch, sizeBytes - held];
        [batch, held] = [[], 0];
        writing = ready.length === 0 ? Promise.resolve() : writeFully(handle, ready, position);
        writing.catch(() => {}); // Awaited on the next turn; until then it must not count as unhandled.
      };
      for await (const chunk of chunks) {
        batch.push(chunk);
        held += chunk.length;
        sizeBytes += chunk.length;
        if (held >= BATCH_BYTES) await flush();
      }
      await flush();
      await writing;
      await handle.sync();
      await handle.close();
      return { file, sizeBytes };
    } catch (error) {
      await writing.catch(() => {});
      await handle.close().catch(() => {});
      await rm(path, { force: true });
      throw error;
    }
  }

  /** The bytes from `start` up to and including `end` of the joined pieces. Files removed meanwhile stay until it is done. */
  async *read(pieces: readonly Piece[], start: number, end: number): AsyncGenerator<Buffer> {
    for (const { file } of pieces) this.#readers.set(file, (this.#readers.get(file) ?? 0) + 1);
    try {
      let offset = 0;
      for (const { file, sizeBytes } of pieces) {
        const from = Math.max(start - offset, 0);
        const to = Math.min(end - offset, sizeBytes - 1);
        offset += sizeBytes;
        if (from > to) continue;
        yield* createReadStream(join(this.#directory, file), { start: from, end: to, highWaterMark: READ_BYTES });
      }
    } finally {
      for (const { file } of pieces) this.#release(file);
    }
  }

  #release(file: string): void {
    const left = (this.#readers.get(file) ?? 1) - 1;
    if (left > 0) return void this.#readers.set(file, left);
    this.#readers.delete(file);
    if (this.#doomed.delete(file)) void rm(join(this.#directory, file), { force: true }).catch(() => {});
  }

  async remove(files: Iterable<string>): Promise<void> {
    for (const file of files) {
      if (this.#readers.has(file)) this.#doomed.add(file);
      else await rm(join(this.#directory, file), { force: true });
    }
  }

  /** Makes the folder, and clears away what a killed process left half written: files that no record names, a day old. */
  async prepare(named: ReadonlySet<string>): Promise<void> {
    await mkdir(this.#directory, { recursive: true });
    for (const file of await readdir(this.#directory)) {
      if (named.has(file)) continue;
      const path = join(this.#directory, file);
      if ((await stat(path)).mtimeMs < Date.now() - ORPHAN_AGE_MS) await rm(path, { force: true });
    }
  }
}

/** A write may take only part of what it was given; go on until all of it is written. */
async function writeFully(handle: Awaited<ReturnType<typeof open>>, batch: Buffer[], position: number): Promise<void> {
  const { bytesWritten } = await handle.writev(batch, position);
  const total = batch.reduce((sum, chunk) => sum + chunk.length, 0);
  if (bytesWritten === total) return;
  if (bytesWritten === 0) throw new Error("The disk takes no more bytes.");
  await writeFully(handle, [Buffer.concat(batch).subarray(bytesWritten)], position + bytesWritten);
}
