import { mkdtempSync, readFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { expect, test } from "vitest";
import { Children } from "@/lib/cli/children.mjs";
import { isAlive } from "@/lib/cli/process-identity.mjs";

const folder = () => mkdtempSync(join(tmpdir(), "children-"));
const place = { cwd: tmpdir(), env: { PATH: process.env.PATH ?? "" } };
const running = (data: string) => JSON.parse(readFileSync(join(data, "children.json"), "utf8")) as string[];
const LASTING = ["-e", "setInterval(() => {}, 1000)"];

test("a server that ends by itself is named, with how and with the end of its log", async () => {
  const children = new Children(folder());
  children.start("store", ["-e", "console.log('the disk is full'); process.exit(3)"], place);
  const sentence = await children.unexpectedEnd;
  expect(sentence).toContain("The store ended by itself (code 3).");
  expect(sentence).toContain("the disk is full");
  await expect(children.orEnd(new Promise(() => {}))).rejects.toThrow("The store ended by itself");
});

test("all are stopped, and being stopped is no crash", async () => {
  const data = folder();
  const children = new Children(data);
  children.start("store", LASTING, place);
  children.start("app", LASTING, place);
  const identities = running(data);
  expect(identities.map(isAlive)).toEqual([true, true]);
  await children.stopAll();
  expect(identities.map(isAlive)).toEqual([false, false]);
  const crash = await Promise.race([children.unexpectedEnd, Promise.resolve("none")]);
  expect(crash).toBe("none");
  expect(() => children.start("late", LASTING, place)).toThrow("everything is being stopped");
});

test("what a killed copy left running is ended by the next", async () => {
  const data = folder();
  new Children(data).start("worker", LASTING, place); // and its owner is never heard of again
  const [left = ""] = running(data);
  expect(isAlive(left)).toBe(true);
  expect(await new Children(data).stopLeftovers()).toBe(1);
  expect(isAlive(left)).toBe(false);
  expect(await new Children(data).stopLeftovers()).toBe(0);
});
