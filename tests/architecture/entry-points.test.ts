import { readFileSync } from "node:fs";
import { expect, test } from "vitest";
import { CONTRACT } from "@/lib/schemas/contract/all";
import { filesBelow } from "../support/files";

const read = (file: string): string => readFileSync(file, "utf8");
const routes = filesBelow("app/api/v1", /\/route\.ts$/);

test("every handler of the API is made by the one wrapper, for the address where its file lies", () => {
  const keys: string[] = [];
  for (const file of routes) {
    const path = file.replace(/^app\/api\/v1/, "").replace(/\/route\.ts$/, "").replace(/\[(\w+)\]/g, "{$1}");
    const exported = [...read(file).matchAll(/^export\b.*$/gm)];
    expect(exported.length, file).toBeGreaterThan(0);
    for (const [line] of exported) {
      const [, method = "", key = ""] = /^export const ([A-Z]+) = door\("([^"]+)"/.exec(line) ?? [];
      expect(key, `${file}: ${line}`).toBe(`${method} ${path}`);
      keys.push(key);
    }
  }
  expect(keys.toSorted()).toEqual(Object.keys(CONTRACT).toSorted());
});

test("there is no other way in: route files only below /api/v1, but for the sign-in library's", () => {
  expect(filesBelow("app", /\/route\.(ts|tsx|js)$/).filter((file) => !routes.includes(file))).toEqual(["app/api/auth/[...nextauth]/route.ts"]);
});

test("no server functions: they would be doors that the contract doesn't list", () => {
  const files = ["app", "components", "lib"].flatMap((folder) => filesBelow(folder, /\.tsx?$/));
  expect(files.length).toBeGreaterThan(100);
  expect(files.filter((file) => /^\s*["']use server["']/m.test(read(file)))).toEqual([]);
});
