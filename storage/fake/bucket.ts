import { randomBytes } from "node:crypto";
import { mkdir, readdir, rm } from "node:fs/promises";
import { join } from "node:path";
import { DataFiles } from "@/storage/fake/data-files";
import {
  readRecords, recordName, syncFolder, writeRecord, type ObjectRecord, type PartRecord, type UploadRecord,
} from "@/storage/fake/records";

/** An upload with the parts that have arrived, by number. */
export type OpenUpload = UploadRecord & { parts: Map<number, PartRecord> };

/** Names of turns, for `inTurn`. Take an upload's turn before a key's, never after, or two could wait for each other. */
export const keyTurn = (key: string): string => `key ${key}`;
export const uploadTurn = (id: string): string => `upload ${id}`;

/**
 * One bucket on the disk. All records are held in memory as well, which keeps listing simple and quick; the disk
 * decides, and is written first.
 *
 * objects/HASH.json  a finished object      uploads/ID/upload.json, N.json  an open upload and its parts
 * data/ID            bytes of an object or part
 */
export class Bucket {
  readonly data: DataFiles;
  readonly uploads = new Map<string, OpenUpload>();
  readonly #directory: string;
  readonly #objects = new Map<string, ObjectRecord>();
  readonly #queues = new Map<string, Promise<unknown>>();
  #sortedKeys: string[] | undefined;

  private constructor(directory: string) {
    this.#directory = directory;
    this.data = new DataFiles(join(directory, "data"));
  }

  /** Opens a bucket's folder, making what is missing in it. */
  static async open(directory: string): Promise<Bucket> {
    const bucket = new Bucket(directory);
    const named = new Set<string>();
    for (const record of (await readRecords(join(directory, "objects"))) as ObjectRecord[]) {
      bucket.#objects.set(record.key, record);
      for (const { file } of record.pieces) named.add(file);
    }
    const uploads = join(directory, "uploads");
    await mkdir(uploads, { recursive: true });
    for (const id of await readdir(uploads)) await bucket.#openUpload(join(uploads, id), named);
    await bucket.data.prepare(named);
    return bucket;
  }

  async #openUpload(folder: string, named: Set<string>): Promise<void> {
    const records = (await readRecords(folder)) as (UploadRecord | PartRecord)[];
    const upload = records.find((record) => "id" in record);
    const parts = records.filter((record) => "number" in record);
    // Killed between completing and tidying: the bytes belong to the object now, and must not go with the upload.
    if (!upload || parts.some((part) => named.has(part.piece.file))) return rm(folder, { recursive: true, force: true });
    this.uploads.set(upload.id, { ...upload, parts: new Map(parts.map((part) => [part.number, part])) });
    for (const part of parts) named.add(part.piece.file);
  }

  /** Runs one task at a time for each name, so that a condition still holds when what depends on it is written. */
  async inTurn<T>(name: string, task: () => Promise<T>): Promise<T> {
    const turn = (this.#queues.get(name) ?? Promise.resolve()).then(task);
    const settled = turn.catch(() => {});
    this.#queues.set(name, settled);
    void settled.then(() => this.#queues.get(name) === settled && this.#queues.delete(name));
    return turn;
  }

  find(key: string): ObjectRecord | undefined {
    return this.#objects.get(key);
  }

  get isEmpty(): boolean {
    return this.#objects.size === 0;
  }

  /** All keys in the order of their UTF-8 bytes, which is the order of S3's lists. */
  keys(): readonly string[] {
    this.#sortedKeys ??= [...this.#objects.keys()]
      .map((key) => [key, Buffer.from(key)] as const)
      .sort(([, a], [, b]) => Buffer.compare(a, b))
      .map(([key]) => key);
    return this.#sortedKeys;
  }

  /** Makes an object visible in one step, in place of an earlier one of its key. Call within `inTurn(keyTurn(key), …)`. */
  async put(record: ObjectRecord): Promise<void> {
    const before = this.#objects.get(record.key);
    await syncFolder(join(this.#directory, "data"));
    await writeRecord(join(this.#directory, "objects", recordName(record.key)), record);
    this.#objects.set(record.key, record);
    if (before) await this.data.remove(before.pieces.map((piece) => piece.file));
    else this.#sortedKeys = undefined;
  }

  /** Call within `inTurn(keyTurn(key), …)`. An object that isn't there is no error, as in S3. */
  async delete(key: string): Promise<void> {
    const record = this.#objects.get(key);
    if (!record) return;
    await rm(join(this.#directory, "objects", recordName(key)), { force: true });
    this.#objects.delete(key);
    this.#sortedKeys = undefined;
    await this.data.remove(record.pieces.map((piece) => piece.file));
  }

  async startUpload(upload: Omit<UploadRecord, "id">): Promise<string> {
    const id = randomBytes(24).toString("hex");
    const folder = join(this.#directory, "uploads", id);
    await mkdir(folder);
    await writeRecord(join(folder, "upload.json"), { id, ...upload });
    this.uploads.set(id, { id, ...upload, parts: new Map() });
    return id;
  }

  /** Records a part, in place of an earlier one of its number. Call within `inTurn(uploadTurn(id), …)`. */
  async putPart(upload: OpenUpload, part: PartRecord): Promise<void> {
    const before = upload.parts.get(part.number);
    await writeRecord(join(this.#directory, "uploads", upload.id, `${part.number}.json`), part);
    upload.parts.set(part.number, part);
    if (before) await this.data.remove([before.piece.file]);
  }

  /** Forgets an upload and the bytes of all its parts but those that an object has taken over. Call within `inTurn(uploadTurn(id), …)`. */
  async endUpload(upload: OpenUpload, taken: ReadonlySet<string>): Promise<void> {
    this.uploads.delete(upload.id);
    await rm(join(this.#directory, "uploads", upload.id), { recursive: true, force: true });
    const files = [...upload.parts.values()].map((part) => part.piece.file);
    await this.data.remove(files.filter((file) => !taken.has(file)));
  }
}
