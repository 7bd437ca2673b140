import { readFileSync } from "node:fs";
import { expect, test } from "vitest";
import { passwordProblem } from "@/lib/core/passwords/password-problem";

type Case = { password: string; mfa: boolean; ok: boolean };
const { cases } = JSON.parse(readFileSync("tests/core/passwords/passwords.json", "utf8")) as { cases: Case[] };
const onlyFactor = cases.filter((each) => !each.mfa);

test("the published cases for a password without a second factor are there", () => {
  expect(onlyFactor.length).toBeGreaterThanOrEqual(6);
});

// Source: NIST SP 800-63B-4, 3.1.1.2 (tests/core/passwords/SOURCE.md).
test.each(onlyFactor)("$password: taken $ok", ({ password, ok }) => {
  expect(passwordProblem(password) === undefined).toBe(ok);
});

// Same section: no composition rules. Each is of one kind of character only.
test.each(["wooden clocks tick slowly", "ZWÖLF LAUTE AMBOSSE", "ключ от старой мастерской", "工具箱在第三個架子的左邊靠窗戶下面"])(
  "%s needs no other kind of character",
  (password) => {
    expect(passwordProblem(password)).toBeUndefined();
  },
);

// Same section: "commonly used, expected, or compromised" as a whole; the words are listed in our own file.
test.each([
  "passwordpassword",
  "Password12345678",
  "PASSWORD-PASSWORD-PASSWORD",
  "qwertyuiop123456789",
  "123456789012345", // 1234567890 and 12345
  "111111111111111",
  "correct horse battery staple",
  "letmein letmein letmein",
  "welcome welcome 2026",
  "Witnessline2026Witnessline",
])("%s is tried first", (password) => {
  expect(passwordProblem(password)).toMatch(/tried first/);
});

// Same section: context-specific words, such as the name of the service, the person's name and what derives from it.
test.each(["Ana Example Ana Example", "anaexampleanaexample", "ana.example@example.org", "quay garage quay garage"])(
  "%s is near to Ana Example of Quay Garage",
  (password) => {
    expect(passwordProblem(password, ["Ana Example", "ana.example@example.org", "Quay Garage"])).toMatch(/your own/);
  },
);

test("a common word among others does no harm, and somebody else's name neither", () => {
  expect(passwordProblem("seven loud dragons password sing")).toBeUndefined();
  expect(passwordProblem("Ana Example Ana Example", ["Bo Sample"])).toBeUndefined();
});

test("a thousand characters are taken quickly, more are refused", () => {
  expect(passwordProblem(`${"ab1 ".repeat(249)}xyzw`)).toBeUndefined();
  expect(passwordProblem("x".repeat(1001))).toMatch(/at most/);
});
