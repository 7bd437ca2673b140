import { spawn, type ChildProcess } from "node:child_process";
import { createHash, randomBytes } from "node:crypto";
import { once } from "node:events";
import { createServer } from "node:net";
import { request } from "node:http";
import { mkdtemp, readFile, readdir, rm, stat, utimes, writeFile } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterEach, beforeEach, describe, expect, test } from "vitest";
import { createObjectStore } from "@/storage/s3";
import { sendRaw } from "./raw-request";
import { isOwnStore } from "./store-under-test";

const keys = { accessKeyId: "KEY", secretAccessKey: "not-a-secret-only-for-tests" };
const BUCKET = "films";
const MIB = 1024 * 1024;

let directory: string;
const running = new Set<ChildProcess>();
beforeEach(async () => { directory = await mkdtemp(join(tmpdir(), "store-")); });
afterEach(async () => {
  for (const child of running) child.kill("SIGKILL");
  running.clear();
  await rm(directory, { recursive: true, force: true });
});

const UNSET = { FAKE_STORE_DIR: "", FAKE_STORE_PORT: "", FAKE_STORE_ORIGINS: "", S3_ACCESS_KEY_ID: "", S3_SECRET_ACCESS_KEY: "" };

function launch(env: Record<string, string>): ChildProcess {
  const child = spawn(process.execPath, ["--import", "tsx", "storage/fake/main.ts"], {
    env: { ...process.env, ...UNSET, ...env }, stdio: ["ignore", "pipe", "pipe"],
  });
  running.add(child);
  return child;
}

const settings = (more = {}) => ({
  FAKE_STORE_DIR: directory, FAKE_STORE_PORT: "0", S3_ACCESS_KEY_ID: keys.accessKeyId, S3_SECRET_ACCESS_KEY: keys.secretAccessKey, ...more,
});

async function start() {
  const child = launch(settings());
  let output = "";
  for await (const chunk of child.stdout ?? []) {
    output += String(chunk);
    if (output.includes("\n")) break;
  }
  const url = /http:\/\/\S+/.exec(output)?.[0];
  if (url === undefined) throw new Error(`The store did not start: ${String(await child.stderr?.toArray())}`);
  const options = { endpoint: url, publicEndpoint: url, region: "us-east-1", bucket: BUCKET, forcePathStyle: true, ...keys };
  return { child, url, store: createObjectStore(options) };
}

async function stop(child: ChildProcess, signal: NodeJS.Signals): Promise<number | null> {
  const ended = once(child, "exit");
  child.kill(signal);
  const [code] = (await ended) as [number | null];
  return code;
}

async function failure(env: Record<string, string>) {
  const child = launch(env);
  let said = "";
  child.stderr?.on("data", (chunk) => { said += String(chunk); });
  const [code] = (await once(child, "close")) as [number | null];
  return { code, said };
}

const dataFiles = async () => (await readdir(join(directory, BUCKET, "data"))).sort();
const hashOf = async (path: string) => createHash("sha256").update(await readFile(path)).digest("hex");

/** Begins a PUT of a megabyte more than it sends, and leaves it hanging. */
async function hangingPut(url: string): Promise<void> {
  const before = (await dataFiles()).length;
  const outgoing = request(url, { method: "PUT", headers: { "content-length": String(3 * MIB) } });
  outgoing.on("error", () => {}); // The kill is meant to end it.
  outgoing.write(Buffer.alloc(2 * MIB));
  const deadline = Date.now() + 5000;
  while ((await dataFiles()).length === before) if (Date.now() > deadline) throw new Error("The body never arrived.");
}

describe.runIf(isOwnStore)("the store as a process", () => {
  test("killed, keeps finished objects and parts, and shows nothing of unfinished ones", async () => {
    const first = await start();
    await first.store.ensureBucket();
    const bytes = randomBytes(5 * MIB + 10);
    await first.store.putObject("finished", bytes, { contentType: "video/mp4" });
    const { uploadId } = await first.store.startMultipart("open", { contentType: "video/mp4" });
    const part = bytes.subarray(0, 5 * MIB);
    await sendRaw(await first.store.presignPart("open", uploadId, 1, 600), { method: "PUT", body: part, headers: { "content-length": String(part.length) } });
    await hangingPut(await first.store.presignPart("open", uploadId, 2, 600));
    await stop(first.child, "SIGKILL");

    const second = await start();
    await second.store.downloadToFile("finished", join(directory, "copy"));
    expect(await hashOf(join(directory, "copy"))).toBe(createHash("sha256").update(bytes).digest("hex"));
    expect((await second.store.listParts("open", uploadId)).map(({ partNumber }) => partNumber)).toEqual([1]);
    const rest = bytes.subarray(5 * MIB);
    await sendRaw(await second.store.presignPart("open", uploadId, 2, 600), { method: "PUT", body: rest, headers: { "content-length": "10" } });
    await second.store.completeMultipart("open", uploadId, bytes.length);
    await stop(second.child, "SIGKILL");

    const third = await start();
    await third.store.downloadToFile("open", join(directory, "copy"));
    expect(await hashOf(join(directory, "copy"))).toBe(createHash("sha256").update(bytes).digest("hex"));
    expect(await third.store.headObject("finished")).toMatchObject({ sizeBytes: bytes.length, contentType: "video/mp4" });
  });

  test("killed at any moment while objects are written over, has the old one or the new one whole", async () => {
    let current = await start();
    await current.store.ensureBucket();
    await current.store.putObject("again", Buffer.alloc(MIB, 0), { contentType: "text/plain" });
    for (let round = 1; round <= 4; round += 1) {
      const { store } = current;
      const writing = Promise.allSettled(Array.from({ length: 12 }, (_, index) => store.putObject("again", Buffer.alloc(MIB, round * 16 + index), { contentType: "text/plain" })));
      await store.headObject("again");
      await stop(current.child, "SIGKILL");
      await writing;
      current = await start();
      await current.store.downloadToFile("again", join(directory, "copy"));
      const copy = await readFile(join(directory, "copy"));
      expect(copy.equals(Buffer.alloc(MIB, copy[0]))).toBe(true);
    }
  });

  test("clears away a day later what a kill left half written", async () => {
    const first = await start();
    await first.store.ensureBucket();
    await first.store.putObject("kept", "x", { contentType: "text/plain" });
    const [kept = ""] = await dataFiles();
    await stop(first.child, "SIGKILL");
    const folder = join(directory, BUCKET, "data");
    for (const name of ["old", "fresh"]) await writeFile(join(folder, name), "half");
    const twoDaysAgo = new Date(Date.now() - 48 * 3_600_000);
    for (const name of ["old", kept]) await utimes(join(folder, name), twoDaysAgo, twoDaysAgo);
    await start();
    expect(await dataFiles()).toEqual([kept, "fresh"].sort());
  });

  test("leaves no bytes behind of what was replaced, refused, aborted or deleted", async () => {
    const { store } = await start();
    await store.ensureBucket();
    for (const body of ["one", "two"]) await store.putObject("a", body, { contentType: "text/plain" });
    await store.putObject("a", "three", { contentType: "text/plain", ifAbsent: true }).catch(() => {});
    await store.putObject("empty", "", { contentType: "text/plain" });
    const { uploadId } = await store.startMultipart("b", { contentType: "text/plain" });
    for (const _ of [1, 2]) await sendRaw(await store.presignPart("b", uploadId, 1, 60), { method: "PUT", body: "x", headers: { "content-length": "1" } });
    expect(await dataFiles()).toHaveLength(2);
    await store.abortMultipart("b", uploadId);
    expect(await dataFiles()).toHaveLength(1);
    await store.deleteObject("a");
    expect(await dataFiles()).toHaveLength(0);
  });

  test("keeps its memory flat while large objects go in and out", async () => {
    const { child, store } = await start();
    await store.ensureBucket();
    const file = join(directory, "large");
    await writeFile(file, Buffer.alloc(256 * MIB, "x"));
    await store.uploadFromFile("large", file, { contentType: "video/mp4" });
    await store.downloadToFile("large", join(directory, "copy"));
    expect((await stat(join(directory, "copy"))).size).toBe(256 * MIB);
    const status = await readFile(`/proc/${child.pid}/status`, "utf8").catch(() => undefined);
    if (status === undefined) return; // Only Linux tells.
    expect(Number(/VmHWM:\s+(\d+) kB/.exec(status)?.[1])).toBeLessThan(220 * 1024);
  });

  test("ends cleanly when told to", async () => {
    const { child } = await start();
    expect(await stop(child, "SIGTERM")).toBe(0);
  });

  test("says what it lacks, and that its port is taken", async () => {
    const { S3_SECRET_ACCESS_KEY: _, ...lacking } = settings();
    expect(await failure(lacking)).toEqual({ code: 1, said: "The store can't start: S3_SECRET_ACCESS_KEY is not set.\n" });
    expect((await failure(settings({ FAKE_STORE_PORT: "80x" }))).said).toContain("FAKE_STORE_PORT must be a port number");
    const other = createServer().listen(0, "127.0.0.1");
    await once(other, "listening");
    const address = other.address();
    const port = typeof address === "object" && address ? String(address.port) : "";
    expect((await failure(settings({ FAKE_STORE_PORT: port }))).said).toContain("its port is taken by another program");
    other.close();
  });
});
