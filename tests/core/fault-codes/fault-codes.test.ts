import { readFileSync } from "node:fs";
import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { FAULT_CODE, faultCodeOf, faultCodesOf } from "@/lib/core/fault-codes/decode-fault-codes";
import { describeFaultCode } from "@/lib/core/fault-codes/describe-fault-code";

const vectors = JSON.parse(readFileSync("tests/core/vectors/vehicle/dtc.json", "utf8"));
const bytesOf = (hex: string) => [...(hex.match(/../g) ?? [])].map((byte) => Number.parseInt(byte, 16));

// Source: vectors/vehicle/dtc.json: published decoder tests, and the same rule computed (each case says which).
test.each(vectors.bytesCases as { bytes: string; code: string | null; source: string }[])("$bytes is $code ($source)", ({ bytes, code }) => {
  const [high = 0, low = 0] = bytesOf(bytes);
  expect(faultCodeOf(high, low)).toBe(code);
});

test.each((vectors.messageCases as { payload?: string; codes: string[] }[]).filter(({ payload }) => payload !== undefined))("payload $payload holds $codes", ({ payload = "", codes }) => {
  expect(faultCodesOf(bytesOf(payload))).toEqual(codes);
});

test("every pair of bytes but 0000 is another code of the published shape", () => {
  const published = new RegExp(vectors.regex);
  const codes = new Set<string>();
  for (let bits = 1; bits <= 0xffff; bits += 1) {
    const code = faultCodeOf(bits >> 8, bits & 0xff) ?? "";
    if (!published.test(code)) throw new Error(code);
    codes.add(code);
  }
  expect(codes.size).toBe(0xffff);
});

test("the shape is the published one", () => {
  expect(FAULT_CODE.source).toBe(vectors.regex);
  fc.assert(fc.property(fc.string({ maxLength: 6 }), (text) => (describeFaultCode(text) !== undefined) === new RegExp(vectors.regex).test(text)));
});

// Source: vectors/vehicle/dtc.json, published rows; P03xx from memory.
describe("cylinders", () => {
  const words: Record<string, string> = {
    "injector circuit/open": "injector circuit open",
    low: "injector circuit low",
    high: "injector circuit high",
    balance: "contribution or balance",
    "misfire detected": "misfire",
  };
  test.each(vectors.cylinderCodes as { code: string; cylinder: number; kind: string }[])("$code is cylinder $cylinder, $kind", ({ code, cylinder, kind }) => {
    expect(describeFaultCode(code)).toMatchObject({ cylinder, meaning: words[kind] });
  });
  test.each(["P0200", "P0213", "P0260", "P0297", "P0313", "P020A", "C0201", "P1201"])("%s counts no cylinder", (code) => {
    expect(describeFaultCode(code)).toMatchObject({ cylinder: null, meaning: null });
  });
});

// Source: ranges of SAE J2012 as quoted in the manual of the CP9150 scan tool, page 18; not compared with the standard.
test.each([
  ["P0420", "powertrain", "shared"],
  ["P1234", "powertrain", "maker"],
  ["P2345", "powertrain", "shared"],
  ["P3000", "powertrain", "maker"],
  ["P33FF", "powertrain", "maker"],
  ["P3400", "powertrain", "shared"],
  ["C0123", "chassis", "shared"],
  ["C2123", "chassis", "maker"],
  ["C3123", "chassis", "shared"],
  ["B1234", "body", "maker"],
  ["B2B10", "body", "maker"],
  ["U0100", "network", "shared"],
  ["U1234", "network", "maker"],
  ["U2001", "network", "maker"],
  ["U3FFF", "network", "shared"],
])("%s: %s, %s", (code, system, defined) => expect(describeFaultCode(code)).toMatchObject({ system, defined }));

test.each(["", "P", "P4000", "p0301", "X0301", "P03011", "P030G"])("“%s” is no fault code", (code) => expect(describeFaultCode(code)).toBeUndefined());
