import { startFakeStore } from "@/storage/fake/server";

// The store as a process of its own. It reads the environment itself, so that it can run without the application's settings.
function need(name: string): string {
  const value = process.env[name];
  if (!value) throw new Error(`${name} is not set.`);
  return value;
}

async function main(): Promise<void> {
  const port = Number(process.env.FAKE_STORE_PORT || "0");
  if (!Number.isInteger(port) || port < 0 || port > 65_535) throw new Error("FAKE_STORE_PORT must be a port number from 0 to 65535.");
  const store = await startFakeStore({
    directory: need("FAKE_STORE_DIR"),
    port,
    host: process.env.FAKE_STORE_HOST || "127.0.0.1",
    accessKeyId: need("S3_ACCESS_KEY_ID"),
    secretAccessKey: need("S3_SECRET_ACCESS_KEY"),
    corsOrigins: (process.env.FAKE_STORE_ORIGINS ?? "").split(",").map((origin) => origin.trim()).filter(Boolean),
  });
  const stop = () => void store.close().then(() => process.exit(0));
  process.once("SIGTERM", stop);
  process.once("SIGINT", stop);
  // Last, since whoever waits for this line may end the process at once.
  console.log(`The store is at ${store.url}`);
}

main().catch((error: NodeJS.ErrnoException) => {
  console.error(error.code === "EADDRINUSE" ? "The store can't start: its port is taken by another program." : `The store can't start: ${error.message}`);
  process.exit(1);
});
