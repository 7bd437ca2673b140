import { CreateBucketCommand, DeleteBucketCommand, DeleteObjectsCommand, ListObjectsV2Command, S3Client } from "@aws-sdk/client-s3";
import { randomUUID } from "node:crypto";
import { mkdtemp, rm } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { startFakeStore } from "@/storage/fake/server";
import { createObjectStore, type ObjectStoreOptions } from "@/storage/s3";

/**
 * The store that the suite is held against: our own by default, or any S3 service named by S3_TEST_ENDPOINT,
 * S3_TEST_REGION, S3_TEST_ACCESS_KEY_ID and S3_TEST_SECRET_ACCESS_KEY, in a bucket that is made for the run.
 */
export const isOwnStore = !process.env.S3_TEST_ENDPOINT;

export const PAGE_ORIGIN = "http://pages.example";

export async function openStoreUnderTest() {
  const accessKeyId = process.env.S3_TEST_ACCESS_KEY_ID ?? "WITNESSLINETESTKEY";
  const secretAccessKey = process.env.S3_TEST_SECRET_ACCESS_KEY ?? "not-a-secret-only-for-tests";
  const region = process.env.S3_TEST_REGION ?? "us-east-1";
  const directory = isOwnStore ? await mkdtemp(join(tmpdir(), "store-")) : undefined;
  const fake = directory
    ? await startFakeStore({ directory, port: 0, host: "127.0.0.1", accessKeyId, secretAccessKey, corsOrigins: [PAGE_ORIGIN] })
    : undefined;
  const endpoint = process.env.S3_TEST_ENDPOINT ?? fake?.url ?? "";
  const bucket = `witnessline-test-${randomUUID().slice(0, 8)}`;
  const credentials = { accessKeyId, secretAccessKey };
  const client = new S3Client({ endpoint, region, credentials, forcePathStyle: true, maxAttempts: 1 });
  await client.send(new CreateBucketCommand({ Bucket: bucket }));
  const options: ObjectStoreOptions = { endpoint, publicEndpoint: endpoint, region, bucket, forcePathStyle: true, ...credentials };

  return {
    endpoint, region, bucket, client, credentials, options, directory,
    store: createObjectStore(options),
    async close() {
      for (;;) {
        const { Contents = [] } = await client.send(new ListObjectsV2Command({ Bucket: bucket }));
        if (Contents.length === 0) break;
        await client.send(new DeleteObjectsCommand({ Bucket: bucket, Delete: { Objects: Contents.map(({ Key }) => ({ Key })) } }));
      }
      await client.send(new DeleteBucketCommand({ Bucket: bucket }));
      client.destroy();
      await fake?.close();
      if (directory) await rm(directory, { recursive: true, force: true });
    },
  };
}

export type StoreUnderTest = Awaited<ReturnType<typeof openStoreUnderTest>>;
