import { createHash, randomUUID } from "node:crypto";
import { mkdir, open, readFile, readdir, rename, rm } from "node:fs/promises";
import { dirname, join } from "node:path";
import type { Checksum, ChecksumAlgorithm, ChecksumType } from "@/storage/fake/checksums";
import type { Piece } from "@/storage/fake/data-files";

/** What is known of a finished object. `headers` are those that come back with it: content type, user metadata. */
export type ObjectRecord = {
  key: string;
  etag: string;
  sizeBytes: number;
  modifiedMs: number;
  headers: Record<string, string>;
  pieces: Piece[];
  checksum?: Checksum | undefined;
};

export type PartRecord = { number: number; etag: string; modifiedMs: number; piece: Piece; checksum?: string | undefined };

/** A multipart upload that was begun and neither completed nor aborted. */
export type UploadRecord = {
  id: string;
  key: string;
  startedMs: number;
  headers: Record<string, string>;
  checksum?: { algorithm: ChecksumAlgorithm; type: ChecksumType } | undefined;
};

/** A record's file is named by the hash of its key, so that no key, however odd or long, can leave the folder. */
export const recordName = (key: string): string => `${createHash("sha256").update(key).digest("hex")}.json`;

const UNFINISHED = ".new";

/** Replaces a record in one step: a reader, or a restart after a kill, finds the old one or the new one, never half. */
export async function writeRecord(path: string, record: unknown): Promise<void> {
  const unfinished = `${path}.${randomUUID()}${UNFINISHED}`;
  const handle = await open(unfinished, "wx");
  try {
    await handle.writeFile(JSON.stringify(record));
    await handle.sync();
  } finally {
    await handle.close();
  }
  await rename(unfinished, path);
  await syncFolder(dirname(path));
}

/** Without this a crash of the machine, though not of the process, could forget that the file was renamed. */
export async function syncFolder(path: string): Promise<void> {
  const folder = await open(path, "r");
  try {
    await folder.sync();
  } finally {
    await folder.close();
  }
}

/** All records of a folder, which is made if it isn't there. Unfinished ones are cleared away. */
export async function readRecords(folder: string): Promise<unknown[]> {
  await mkdir(folder, { recursive: true });
  const records: unknown[] = [];
  for (const name of await readdir(folder)) {
    const path = join(folder, name);
    if (name.endsWith(UNFINISHED)) await rm(path, { force: true });
    else if (name.endsWith(".json")) records.push(JSON.parse(await readFile(path, "utf8")));
  }
  return records;
}
