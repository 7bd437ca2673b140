import { mkdtemp, rm } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterAll, beforeAll } from "vitest";
import { startFakeStore, type FakeStore } from "@/storage/fake/server";
import { getStore } from "@/storage/store";

/** Gives the calling test file a store of its own behind `getStore()`, with an empty bucket. Call it before anything reads the environment. */
export function testStore(): { stop: () => Promise<void> } {
  let directory = "";
  let fake: FakeStore | undefined;

  beforeAll(async () => {
    directory = await mkdtemp(join(tmpdir(), "store-"));
    const { S3_ACCESS_KEY_ID: accessKeyId = "", S3_SECRET_ACCESS_KEY: secretAccessKey = "" } = process.env;
    fake = await startFakeStore({ directory, port: 0, host: "127.0.0.1", accessKeyId, secretAccessKey, corsOrigins: ["http://app.test"] });
    Object.assign(process.env, { S3_ENDPOINT: fake.url, S3_PUBLIC_ENDPOINT: fake.url });
    await getStore().ensureBucket();
  });

  afterAll(async () => {
    await fake?.close();
    await rm(directory, { recursive: true, force: true });
  });

  return { stop: async () => fake?.close() };
}
