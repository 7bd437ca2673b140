import { readFileSync } from "node:fs";
import { expect, test } from "vitest";

const readme = readFileSync("README.md", "utf8");
const named = (text: string, pattern: RegExp): string[] => [...new Set([...text.matchAll(pattern)].map(([, name]) => name ?? ""))].toSorted();

test("README's table names every variable that is read, and no other", () => {
  const table = readme.split("\n").filter((line) => line.startsWith("| `"));
  const read = named(readFileSync("lib/env.ts", "utf8"), /^ {2}([A-Z][A-Z0-9_]+):/gm);
  // The owner's connection is asked for by the commands that need it, and by nothing that runs all day.
  expect(named(table.map((line) => line.split("|")[1]).join("\n"), /`([A-Z0-9_]+)`/g)).toEqual([...read, "MIGRATION_DATABASE_URL"].toSorted());
});

test("commands that the guides name exist", () => {
  const { scripts } = JSON.parse(readFileSync("package.json", "utf8")) as { scripts: Record<string, string> };
  const guides = readme + readFileSync("DEVELOPERS.md", "utf8");
  for (const name of named(guides, /npm run ([a-z-]+)/g)) expect(scripts, name).toHaveProperty(name);
});
