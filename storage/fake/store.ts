import { mkdir, readdir, rm } from "node:fs/promises";
import { join } from "node:path";
import { Bucket } from "@/storage/fake/bucket";
import { Refusal } from "@/storage/fake/refusal";

// A name of this form is also safe as the name of a folder. Source: Amazon S3 user guide, "Bucket naming rules".
const NAME = /^(?!\d+\.\d+\.\d+\.\d+$)[a-z0-9](?:[a-z0-9-]|\.(?!\.)){1,61}[a-z0-9]$/;

/** The buckets under one directory. */
export class Store {
  readonly #directory: string;
  readonly #buckets = new Map<string, Bucket>();

  private constructor(directory: string) {
    this.#directory = directory;
  }

  static async open(directory: string): Promise<Store> {
    const store = new Store(directory);
    await mkdir(directory, { recursive: true });
    for (const entry of await readdir(directory, { withFileTypes: true })) {
      const { name } = entry;
      if (entry.isDirectory() && NAME.test(name)) store.#buckets.set(name, await Bucket.open(join(directory, name)));
    }
    return store;
  }

  names(): string[] {
    return [...this.#buckets.keys()].sort();
  }

  /** @throws Refusal NoSuchBucket */
  bucket(name: string): Bucket {
    const bucket = this.#buckets.get(name);
    if (!bucket) throw new Refusal("NoSuchBucket", "The specified bucket does not exist", { details: { BucketName: name } });
    return bucket;
  }

  /** @throws Refusal InvalidBucketName, BucketAlreadyOwnedByYou */
  async create(name: string): Promise<void> {
    if (!NAME.test(name)) throw new Refusal("InvalidBucketName", "The specified bucket is not valid.");
    if (this.#buckets.has(name)) throw new Refusal("BucketAlreadyOwnedByYou", "You already have a bucket of that name.");
    const bucket = await Bucket.open(join(this.#directory, name));
    // Of two requests at once the first wins; both mean the same folder.
    if (!this.#buckets.has(name)) this.#buckets.set(name, bucket);
  }

  /** @throws Refusal NoSuchBucket, BucketNotEmpty */
  async delete(name: string): Promise<void> {
    if (!this.bucket(name).isEmpty) throw new Refusal("BucketNotEmpty", "The bucket you tried to delete is not empty.");
    this.#buckets.delete(name);
    await rm(join(this.#directory, name), { recursive: true, force: true });
  }
}
