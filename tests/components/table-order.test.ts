import { expect, test } from "vitest";
import { filterRows, searchTexts, sortRows, type Row } from "@/components/ui/table-order";

const row = (id: string, bay: string, days: number, day: string): Row => ({
  id,
  cells: { bay: { show: bay, sort: bay }, days: { show: days === -1 ? "–" : days, sort: days }, day: { show: day, sort: Date.parse(day) } },
});
const ROWS = [row("a", "Bay 10", 3, "12 Sep 2024"), row("b", "bay 9", 20, "2 Sep 2024"), row("c", "Bay 10", -1, "1 Dec 2026")];
const ids = (rows: readonly Row[]) => rows.map(({ id }) => id).join("");

test("numbers sort as numbers, in both directions", () => {
  expect(ids(sortRows(ROWS, { key: "days", descending: false }))).toBe("cab");
  expect(ids(sortRows(ROWS, { key: "days", descending: true }))).toBe("bac");
});

test("words sort as people read them, and equal rows keep their places", () => {
  expect(ids(sortRows(ROWS, { key: "bay", descending: false }))).toBe("bac");
});

test("a row is found by what is shown, whatever it sorts by; all words must be there, in any order and size", () => {
  const find = (filter: string) => ids(filterRows(ROWS, searchTexts(ROWS), filter));
  expect(find("sep")).toBe("ab");
  expect(find("SEP bay 10")).toBe("a");
  expect(find("oct")).toBe("");
  expect(find("  ")).toBe("abc");
});

test("ten thousand rows sort and filter between two key presses", () => {
  const many = Array.from({ length: 10_000 }, (_, index) => row(String(index), `Bay ${(index * 7919) % 10_000}`, index, "1 Dec 2026"));
  const texts = searchTexts(many);
  const began = performance.now();
  const found = sortRows(filterRows(many, texts, "bay 1"), { key: "bay", descending: false });
  // Generous for a busy machine; a person waits for nothing shorter than this.
  expect(performance.now() - began).toBeLessThan(500);
  // Worked by hand: "bay 1…" and the "1 Dec" of every row.
  expect(found).toHaveLength(10_000);
  expect(found[9_999]?.cells["bay"]?.sort).toBe("Bay 9999");
});
