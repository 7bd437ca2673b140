import { readdirSync } from "node:fs";
import { expect, test } from "vitest";
import { SHOT_ROLES } from "@/lib/cli/shots-pages";

const pages = readdirSync("app", { recursive: true, encoding: "utf8" })
  .filter((file) => /(^|\/)page\.tsx$/.test(file))
  .map((file) => `/${file.replace(/\/?page\.tsx$/, "")}`.replace(/\/\([^)]*\)/g, ""));

/** Addresses that only lead on to another page. */
const LEADS_ON = ["/o/[org]"];

test.each(pages.filter((page) => !LEADS_ON.includes(page)))("%s is among the pages that are looked at", (page) => {
  const shape = new RegExp(`^${(page || "/").replace(/\[[^\]]+\]/g, "[^/]+")}$`);
  const looked = SHOT_ROLES.flatMap((role) => role.pages.map(({ path }) => path.replace(/\?.*$/, "")));
  expect(looked.some((path) => shape.test(path))).toBe(true);
});
