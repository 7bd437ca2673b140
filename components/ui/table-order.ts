import type { ReactNode } from "react";

/** One cell: what is shown, and what it sorts by. It is found by both. */
export type Cell = { show: ReactNode; sort: string | number };
export type Row = { id: string; cells: Record<string, Cell> };
export type Order = { key: string; descending: boolean };

// Made once: comparing through it is many times quicker than asking the language anew for every pair.
const alphabet = new Intl.Collator("en", { numeric: true, sensitivity: "base" });

/** What each row is found by, in small letters: its cells as they are shown and as they sort. */
export function searchTexts(rows: readonly Row[]): string[] {
  return rows.map((row) =>
    Object.values(row.cells)
      .flatMap(({ show, sort }) => (typeof show === "string" || typeof show === "number" ? [show, sort] : [sort]))
      .join(" ")
      .toLowerCase(),
  );
}

/** Rows whose text has every word of `filter`, in any order. @param texts from searchTexts, one for each row */
export function filterRows(rows: readonly Row[], texts: readonly string[], filter: string): readonly Row[] {
  const words = filter.toLowerCase().split(/\s+/).filter(Boolean);
  if (words.length === 0) return rows;
  return rows.filter((_, index) => words.every((word) => texts[index]?.includes(word)));
}

/** Sorted by one column; numbers as numbers, words as people read them ("Bay 9" before "Bay 10"). Equal rows keep their places. */
export function sortRows(rows: readonly Row[], { key, descending }: Order): Row[] {
  const sign = descending ? -1 : 1;
  return rows.toSorted((a, b) => {
    const [x, y] = [a.cells[key]?.sort ?? "", b.cells[key]?.sort ?? ""];
    return sign * (typeof x === "number" && typeof y === "number" ? x - y : alphabet.compare(String(x), String(y)));
  });
}
