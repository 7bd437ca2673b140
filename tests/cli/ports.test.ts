import { createServer } from "node:net";
import { mkdtempSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { expect, test } from "vitest";
import { choosePorts, isPortFree, keepPorts, readPorts } from "@/lib/cli/ports.mjs";

const free = (...taken: number[]) => async (port: number) => !taken.includes(port);

test("takes the usual ports where they are free", async () => {
  expect(await choosePorts({ app: 4200, store: 4201 }, {}, free())).toEqual({ app: 4200, store: 4201 });
});

test("takes the next free one, ten further on, for a taken port", async () => {
  expect(await choosePorts({ app: 4200, store: 4201 }, {}, free(4200, 4210))).toEqual({ app: 4220, store: 4201 });
});

test("prefers the port of last time, and leaves it when somebody else has it now", async () => {
  expect(await choosePorts({ app: 4200 }, { app: 4250 }, free())).toEqual({ app: 4250 });
  expect(await choosePorts({ app: 4200 }, { app: 4250 }, free(4250))).toEqual({ app: 4200 });
});

test("never gives one port to two names", async () => {
  expect(await choosePorts({ app: 4200, store: 4200 }, {}, free())).toEqual({ app: 4200, store: 4210 });
});

test("says in a sentence when no port is free", async () => {
  await expect(choosePorts({ app: 4200 }, {}, async () => false)).rejects.toThrow("No free port was found for the app");
});

test("sees that a port is taken, and that it is free again", async () => {
  const other = createServer();
  const port = await new Promise<number>((resolve) => other.listen(0, "127.0.0.1", () => resolve((other.address() as { port: number }).port)));
  expect(await isPortFree(port)).toBe(false);
  await new Promise((resolve) => other.close(resolve));
  expect(await isPortFree(port)).toBe(true);
});

test("keeps ports for the next start, name by name", () => {
  const folder = mkdtempSync(join(tmpdir(), "ports-"));
  expect(readPorts(folder)).toEqual({});
  keepPorts(folder, { postgres: 4204 });
  keepPorts(folder, { app: 4200 });
  expect(readPorts(folder)).toEqual({ postgres: 4204, app: 4200 });
});
