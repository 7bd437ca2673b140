import { mkdtemp, readdir, rm, statfs } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { AppError } from "@/lib/core/errors";
import { MediaFault } from "@/lib/jobs/media/media-fault";
import { getStore } from "@/storage/store";

const SPARE_BYTES = 512 * 1024 * 1024;

/** A folder of the worker's own for one recording. What is fetched from the store is fetched once. */
export type Workspace = {
  path(name: string): string;
  /** Path of an object's bytes on this disk. @throws AppError("not_found" | "unavailable"); MediaFault when the disk has no room for it */
  fetch(storeKey: string): Promise<string>;
  /** Says that `path` holds what is now in the store under `storeKey`, so that it need not be fetched. */
  keep(storeKey: string, path: string): void;
  remove(): Promise<void>;
};

/** Opens a workspace, and removes what a killed worker left of the same recording's. */
export async function openWorkspace(recordingId: string): Promise<Workspace> {
  const prefix = `witnessline-${recordingId}-`;
  for (const name of await readdir(tmpdir())) if (name.startsWith(prefix)) await rm(join(tmpdir(), name), { recursive: true, force: true });
  const folder = await mkdtemp(join(tmpdir(), prefix));
  const fetched = new Map<string, string>();
  return {
    path: (name) => join(folder, name),
    keep: (storeKey, path) => void fetched.set(storeKey, path),
    async fetch(storeKey) {
      const there = fetched.get(storeKey);
      if (there) return there;
      const facts = await getStore().headObject(storeKey);
      if (!facts) throw new AppError("not_found", "The film is no longer in the store.");
      const { bavail, bsize } = await statfs(folder);
      if (bavail * bsize < facts.sizeBytes + SPARE_BYTES) {
        throw new MediaFault("The worker’s disk has no room for this film at the moment. Try again when it was cleared.");
      };
      const path = join(folder, `object-${fetched.size}`);
      await getStore().downloadToFile(storeKey, path);
      fetched.set(storeKey, path);
      return path;
    },
    remove: () => rm(folder, { recursive: true, force: true }),
  };
}
