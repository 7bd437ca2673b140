import { spawn } from "node:child_process";
import { once } from "node:events";
import { mkdirSync, mkdtempSync, readdirSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { expect, test } from "vitest";
import { lockDataFolder } from "@/lib/cli/lock.mjs";
import { identify, isAlive } from "@/lib/cli/process-identity.mjs";

const folder = () => mkdtempSync(join(tmpdir(), "lock-"));
const otherProcess = () => spawn(process.execPath, ["-e", "setInterval(() => {}, 1000)"]);

test("one copy gets the folder, and gives it free again", () => {
  const data = folder();
  const release = lockDataFolder(data);
  expect(readdirSync(join(data, "running"))).toEqual([identify(process.pid)]);
  release();
  expect(readdirSync(join(data, "running"))).toEqual([]);
});

test("a second copy is refused while the first one runs, and leaves no claim", async () => {
  const data = folder();
  const first = otherProcess();
  const release = lockDataFolder(data, identify(first.pid ?? 0));
  expect(() => lockDataFolder(data)).toThrow(`Another copy already works on ${data} (process ${first.pid})`);
  expect(readdirSync(join(data, "running"))).toHaveLength(1);
  release();
  first.kill();
  await once(first, "exit");
});

test("the claim of a copy that was killed is swept away", async () => {
  const data = folder();
  const first = otherProcess();
  lockDataFolder(data, identify(first.pid ?? 0));
  first.kill("SIGKILL");
  await once(first, "exit");
  lockDataFolder(data);
  expect(readdirSync(join(data, "running"))).toEqual([identify(process.pid)]);
});

test("a process number that was handed out again does not hold the folder", () => {
  const data = folder();
  // Our own number with another moment of start: what a claim looks like after its number went to somebody else.
  const before = (identify(process.pid) ?? "").replace(/\d+$/, "1");
  expect(isAlive(before)).toBe(false);
  mkdirSync(join(data, "running"));
  writeFileSync(join(data, "running", before), "");
  lockDataFolder(data);
  expect(readdirSync(join(data, "running"))).toEqual([identify(process.pid)]);
});
