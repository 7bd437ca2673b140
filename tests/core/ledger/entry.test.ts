import { createHash, createHmac } from "node:crypto";
import { expect, test } from "vitest";
import { ledgerEntry } from "@/lib/core/ledger/entry";
import { saltedHash } from "@/lib/core/ledger/salted-hash";
import { signOffEntry } from "@/lib/core/ledger/sign-off-entry";

const SALT = "5a".repeat(32);
const AT = { organisationId: "org", leafIndex: 7, recordedAt: "2026-12-01T10:00:00.000Z" };

// Source: RFC 4231, test cases 1 and 6 (values from memory; the next test holds them to Node's own HMAC).
test.each([
  ["0b".repeat(20), "Hi There", "b0344c61d8db38535ca8afceaf0bf12b881dc200c9833da726e9376c2e32cff7"],
  ["aa".repeat(131), "Test Using Larger Than Block-Size Key - Hash Key First", "60e431591ee0b67f0d8a26aacbf5b77f8e0bc6213728c5140546040f0ee37f54"],
])("a salted hash is HMAC-SHA-256 keyed with the salt: %#", (salt, value, expected) => {
  expect(saltedHash(salt, value)).toBe(expected);
  expect(createHmac("sha256", Buffer.from(salt, "hex")).update(value).digest("hex")).toBe(expected);
});

test("the same name under two salts can't be told to be the same", () => {
  expect(saltedHash("11".repeat(16), "Ana Example")).not.toBe(saltedHash("22".repeat(16), "Ana Example"));
});

test.each(["", "0b0b", "0b".repeat(15)])("a salt of too few bytes is refused: %j", (salt) => {
  expect(() => saltedHash(salt, "Ana Example")).toThrow(RangeError);
});

const sheet = {
  observationId: "obs",
  taskId: "task",
  taskRevision: 2,
  taskContentHash: "ab".repeat(32),
  outcome: "met" as const,
  level: 3 as const,
  stoppedForSafety: false,
  marks: [{ key: "C1", mark: "met" as const, reading: null, prompts: 0, remark: "Ana asked twice" }],
  startedAt: "2026-12-01T09:00:00.000Z",
  apprentice: { personId: "p1", name: "Ana Example" },
  assessor: { personId: "p2", name: "Bo Sample" },
  vehicle: "DEMO 001",
  jobCardNumber: "JC-17",
  feedback: "Calm work",
};

test("a sign-off's text holds what was decided and nothing that names a person, a vehicle or a customer", () => {
  const { kind, subject, personal } = signOffEntry(sheet);
  const { canonical } = ledgerEntry({ kind, subject, personal: personal.map((value) => ({ ...value, salt: SALT })) }, AT);
  for (const word of ["Ana", "Bo Sample", "DEMO 001", "JC-17", "Calm", "asked twice", SALT]) expect(canonical).not.toContain(word);
  const read = JSON.parse(canonical) as { version: number; kind: string; leafIndex: number; subject: object; personal: Record<string, string> };
  expect(read).toMatchObject({ version: 1, kind: "sign_off", leafIndex: 7, recordedAt: AT.recordedAt, organisationId: "org" });
  expect(read.subject).toMatchObject({ outcome: "met", level: 3, taskContentHash: "ab".repeat(32), marks: [{ key: "C1", mark: "met" }] });
  expect(Object.keys(read.personal)).toEqual(["apprentice", "assessor", "feedback", "job_card", "remark:C1", "vehicle"]);
  expect(read.personal.apprentice).toBe(saltedHash(SALT, "Ana Example"));
});

test("what was left empty is not hashed: there is nothing to erase", () => {
  const { personal } = signOffEntry({ ...sheet, feedback: "", marks: [] });
  expect(personal.map((value) => value.label)).toEqual(["apprentice", "assessor", "vehicle", "job_card"]);
});

// Source: RFC 6962, 2.1: a leaf's hash is SHA-256(0x00 ‖ entry).
test("the leaf is the hash of the entry's own text", () => {
  const { canonical, leafHash } = ledgerEntry({ kind: "withdrawal", subject: { signOffId: "s" }, personal: [] }, AT);
  expect(leafHash).toBe(createHash("sha256").update(Buffer.concat([Buffer.of(0), Buffer.from(canonical)])).digest("hex"));
});

test("two personal values of one label are refused: the second would drop out unseen", () => {
  const personal = ["a", "b"].map((value) => ({ personId: "p1", label: "reason", value, salt: SALT }));
  expect(() => ledgerEntry({ kind: "withdrawal", subject: {}, personal }, AT)).toThrow(RangeError);
});
