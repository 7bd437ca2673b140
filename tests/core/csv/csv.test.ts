import { readFileSync } from "node:fs";
import { stringify } from "csv-stringify/sync";
import fc from "fast-check";
import { expect, test } from "vitest";
import { RFC_4180 } from "@/lib/core/csv/rfc4180";
import { safeCell } from "@/lib/core/csv/safe-cell";

const { cases } = JSON.parse(readFileSync("tests/core/vectors/security/csv-injection.json", "utf8")) as { cases: { in: string; out: string }[] };
const line = (...cells: string[]) => stringify([cells.map(safeCell)], RFC_4180);

test("all thirteen cases are there", () => {
  expect(cases).toHaveLength(13);
});

// Source: OWASP ASVS 5.0.0, V1.2.10, and RFC 4180 (tests/core/vectors/security/SOURCE.md); written as it is sent.
test.each(cases)("$in is written $out", ({ in: text, out }) => {
  expect(line(text, "next")).toBe(`${out},next\r\n`);
});

// Beyond the standard's list (OWASP, "CSV Injection", from memory).
test.each(["\r=1", "\n=1", "＝1+1", "＋1", "－1", "＠SUM(A1)"])("%j is text as well", (text) => {
  expect(safeCell(text)).toBe(`'${text}`);
});

// Source: RFC 4180, section 2, rule 6: a cell with any part of a line end is quoted, or its row breaks in two.
test.each(["a\nb", "a\rb", "a\r\nb"])("%j stays in its row", (text) => {
  expect(line(text, "next")).toBe(`"${text}",next\r\n`);
});

/** Reads RFC 4180, section 2, by itself: quoted cells with doubled quotes, commas, CRLF. */
function readCsv(text: string): string[][] {
  const rows: string[][] = [];
  let cells: string[] = [];
  const cell = /(?:"((?:[^"]|"")*)"|([^",\r\n]*))(,|\r\n)/gy;
  for (const [, quoted, plain = "", end] of text.matchAll(cell)) {
    cells.push(quoted === undefined ? plain : quoted.replaceAll('""', '"'));
    if (end === "\r\n") {
      rows.push(cells);
      cells = [];
    }
  }
  return rows;
}

test("whatever the cells hold, a reader gets the same rows and no cell begins like a formula", () => {
  const table = fc.array(fc.array(fc.string({ unit: fc.constantFrom(..."=+-@\t\r\n\0\"',; aé") }), { minLength: 3, maxLength: 3 }), { minLength: 1, maxLength: 5 });
  fc.assert(
    fc.property(table, (rows) => {
      const read = readCsv(stringify(rows.map((row) => row.map(safeCell)), RFC_4180));
      expect(read).toEqual(rows.map((row) => row.map(safeCell)));
      for (const cell of read.flat()) expect(cell).not.toMatch(/^[=+\-@\t\r\0]/);
    }),
  );
});
