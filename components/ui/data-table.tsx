"use client";

import { useMemo, useState, type ReactNode } from "react";
import { Button } from "@/components/ui/button";
import { TextField } from "@/components/ui/field";

/** One cell: what is shown, and what it sorts and is found by. */
export type Cell = { show: ReactNode; sort: string | number };
export type Column = { key: string; label: string; numeric?: boolean };
export type Row = { id: string; cells: Record<string, Cell> };

type DataTableProps = {
  caption: string;
  columns: readonly Column[];
  rows: readonly Row[];
  /** Column that it is sorted by at first. */
  sortedBy?: { key: string; descending?: boolean };
  /** What to say when the filter finds nothing. */
  nothingFound?: string;
};

/** Shown at once; more on demand, so that ten thousand rows cost no more than these. */
const PAGE = 100;

/** A real table that sorts and filters; on a phone each row is a job card with the same facts. */
export function DataTable({ caption, columns, rows, sortedBy, nothingFound = "Nothing fits the filter." }: DataTableProps) {
  const [filter, setFilter] = useState("");
  const [order, setOrder] = useState({ key: sortedBy?.key ?? columns[0]?.key ?? "", descending: sortedBy?.descending ?? false });
  const [shown, setShown] = useState(PAGE);
  const found = useMemo(() => sortRows(filterRows(rows, filter), order), [rows, filter, order]);
  const visible = found.slice(0, shown);
  return (
    <div>
      {rows.length > 5 && (
        <div className="flex flex-wrap items-end gap-4 border-b border-rule px-4 py-3" data-no-print>
          <TextField label="Filter" type="search" value={filter} onChange={(event) => setFilter(event.target.value)} className="w-full max-w-80" />
          <p className="pb-2 text-ink2" role="status">
            {found.length} of {rows.length}
          </p>
        </div>
      )}
      <table className="w-full border-collapse">
        <caption className="sr-only">{caption}</caption>
        <thead className="max-md:sr-only">
          <tr>
            {columns.map((column) => (
              <th key={column.key} scope="col" aria-sort={order.key !== column.key ? "none" : order.descending ? "descending" : "ascending"} className="border-b-2 border-steel text-left">
                <button
                  type="button"
                  className={`min-h-11 w-full px-4 font-plate text-[1.05rem] font-semibold ${column.numeric ? "text-right" : "text-left"}`}
                  onClick={() => setOrder({ key: column.key, descending: order.key === column.key && !order.descending })}
                >
                  {column.label} <span aria-hidden>{order.key === column.key ? (order.descending ? "↓" : "↑") : ""}</span>
                </button>
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {visible.map((row) => (
            <tr key={row.id} className="border-b border-rule last:border-b-0 max-md:grid max-md:gap-0.5 max-md:px-4 max-md:py-3">
              {columns.map((column, index) => (
                <td
                  key={column.key}
                  className={`md:px-4 md:py-2.5 max-md:flex max-md:gap-2 ${index === 0 ? "max-md:text-[1.05rem] max-md:font-semibold" : ""} ${column.numeric ? "tabular md:text-right md:font-mono" : ""}`}
                >
                  {index > 0 && <span className="w-32 shrink-0 text-ink2 md:hidden">{column.label}</span>}
                  <span className="min-w-0">{row.cells[column.key]?.show}</span>
                </td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
      {found.length === 0 && <p className="px-4 py-6 text-ink2">{nothingFound}</p>}
      {found.length > shown && (
        <div className="px-4 py-3" data-no-print>
          <Button onClick={() => setShown(shown + PAGE)}>Show {Math.min(PAGE, found.length - shown)} more</Button>
        </div>
      )}
    </div>
  );
}

function filterRows(rows: readonly Row[], filter: string): readonly Row[] {
  const words = filter.toLowerCase().split(/\s+/).filter(Boolean);
  if (words.length === 0) return rows;
  return rows.filter((row) => {
    const text = Object.values(row.cells)
      .map((cell) => String(cell.sort).toLowerCase())
      .join(" ");
    return words.every((word) => text.includes(word));
  });
}

function sortRows(rows: readonly Row[], { key, descending }: { key: string; descending: boolean }): Row[] {
  const sign = descending ? -1 : 1;
  return rows.toSorted((a, b) => {
    const [x, y] = [a.cells[key]?.sort ?? "", b.cells[key]?.sort ?? ""];
    return sign * (typeof x === "number" && typeof y === "number" ? x - y : String(x).localeCompare(String(y), "en"));
  });
}
