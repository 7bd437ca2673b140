import { env } from "@/lib/env";
import type { ObjectStore } from "@/storage/objects";
import { createObjectStore } from "@/storage/s3";

let store: ObjectStore | undefined;

/** The installation's object store, from the environment. One client per process. */
export function getStore(): ObjectStore {
  if (!store) {
    const { S3_ENDPOINT, S3_PUBLIC_ENDPOINT, S3_REGION, S3_BUCKET, S3_ACCESS_KEY_ID, S3_SECRET_ACCESS_KEY, S3_FORCE_PATH_STYLE } = env();
    store = createObjectStore({
      endpoint: S3_ENDPOINT,
      publicEndpoint: S3_PUBLIC_ENDPOINT,
      region: S3_REGION,
      bucket: S3_BUCKET,
      accessKeyId: S3_ACCESS_KEY_ID,
      secretAccessKey: S3_SECRET_ACCESS_KEY,
      forcePathStyle: S3_FORCE_PATH_STYLE,
    });
  }
  return store;
}
