import { createHash } from "node:crypto";
import { readFileSync } from "node:fs";
import fc from "fast-check";
import { expect, test } from "vitest";
import { sha256Hex } from "@/lib/core/ledger/bytes";
import { canonicalJson } from "@/lib/core/ledger/canonical-json";

const read = (file: string) => readFileSync(`tests/core/vectors/ledger/${file}`, "utf8");
const jcs = JSON.parse(read("jcs.json")) as {
  files: { name: string; input: string; output: string; outputHex: string; sha256: string }[];
  numbers: { ieee754: string; json: string | null; comment: string }[];
};

test("all published cases are there", () => {
  expect(jcs.files).toHaveLength(6);
  expect(jcs.numbers).toHaveLength(25);
});

// Source: RFC 8785's own test data (tests/core/vectors/ledger/SOURCE.md): output text, its bytes, and their hash.
test.each(jcs.files)("RFC 8785 test data: $name", ({ input, output, outputHex, sha256 }) => {
  const text = canonicalJson(JSON.parse(read(input)));
  expect(text).toBe(read(output));
  expect(Buffer.from(text).toString("hex")).toBe(outputHex);
  expect(sha256Hex(text)).toBe(sha256);
});

// Source: RFC 8785, appendix B. A row without text is a value that JSON can't carry.
test.each(jcs.numbers)("RFC 8785 appendix B: $ieee754 is $json", ({ ieee754, json }) => {
  const value = Buffer.from(ieee754, "hex").readDoubleBE();
  if (json === null || !Number.isFinite(value)) expect(() => canonicalJson(value)).toThrow(TypeError);
  else expect(canonicalJson(value)).toBe(json);
});

// Source: RFC 8785, 3.2.2 (I-JSON: no lone surrogates, no NaN or infinity); the rest is what JSON would drop or change unseen.
test.each([
  ["undefined", undefined],
  ["an undefined member", { a: undefined }],
  ["undefined in a list", [1, undefined]],
  ["a hole in a list", [1, , 2]],
  ["NaN", { a: Number.NaN }],
  ["infinity", [Number.NEGATIVE_INFINITY]],
  ["a big integer", { a: 1n }],
  ["a function", { a: () => 1 }],
  ["a symbol", [Symbol("a")]],
  ["a lone high surrogate", { a: "x\ud800" }],
  ["a lone low surrogate", ["\udc00x"]],
  ["a lone surrogate as a key", { "\ud83d": 1 }],
  ["a date", { at: new Date(0) }],
  ["a map", { a: new Map([["b", 1]]) }],
  ["a thing that writes itself", { a: { toJSON: () => 1 } }],
])("refuses %s", (_name, value) => {
  expect(() => canonicalJson(value)).toThrow(TypeError);
});

test("says where in a value the fault lies", () => {
  expect(() => canonicalJson({ marks: [{ reading: Number.NaN }] })).toThrow("$.marks[0].reading");
});

test("whatever the order of its members, a value has one text, and it reads back as the same value", () => {
  fc.assert(
    fc.property(fc.dictionary(fc.string({ unit: "grapheme" }), fc.jsonValue({ stringUnit: "grapheme" })), (value) => {
      const turned = Object.fromEntries(Object.entries(value).toReversed());
      expect(canonicalJson(turned)).toBe(canonicalJson(value));
      // -0 is written 0 (RFC 8785, appendix B), so both sides go through JSON.
      expect(JSON.parse(canonicalJson(value))).toEqual(JSON.parse(JSON.stringify(value)));
    }),
  );
});

const { tests } = JSON.parse(read("sha256.json")) as { tests: { ascii: string; repeat?: number; sha256: string }[] };

// Source: FIPS 180-4 examples.
test.each(tests)("SHA-256 of $ascii", ({ ascii, repeat = 1, sha256 }) => {
  expect(sha256Hex(ascii.repeat(repeat))).toBe(sha256);
});

test("SHA-256 takes a text's UTF-8 bytes, as Node's own does", () => {
  expect(sha256Hex("Prüfstück 🔧")).toBe(createHash("sha256").update("Prüfstück 🔧", "utf8").digest("hex"));
});
