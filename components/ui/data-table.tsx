"use client";

import { useDeferredValue, useMemo, useState } from "react";
import { Button } from "@/components/ui/button";
import { SelectField, TextField } from "@/components/ui/field";
import { filterRows, searchTexts, sortRows, type Order, type Row } from "@/components/ui/table-order";

export type { Cell, Row } from "@/components/ui/table-order";
export type Column = { key: string; label: string; numeric?: boolean };

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
/** Fewer are seen at a glance and need no filter. */
const FILTER_FROM = 6;

/** A real table that sorts and filters; on a phone each row is a job card with the same facts. The roles are told, since cards take them away. */
export function DataTable({ caption, columns, rows, sortedBy, nothingFound = "Nothing fits the filter." }: DataTableProps) {
  const [filter, setFilter] = useState("");
  const [order, setOrder] = useState<Order>({ key: sortedBy?.key ?? columns[0]?.key ?? "", descending: sortedBy?.descending ?? false });
  const [shown, setShown] = useState(PAGE);
  const sought = useDeferredValue(filter);
  const texts = useMemo(() => searchTexts(rows), [rows]);
  const sorted = useMemo(() => sortRows(filterRows(rows, texts, sought), order), [rows, texts, sought, order]);
  return (
    <div>
      {rows.length > 1 && (
        <div className={`flex flex-wrap items-end gap-x-4 gap-y-2 border-b border-rule px-4 py-3 ${rows.length < FILTER_FROM ? "md:hidden" : ""}`} data-no-print>
          {rows.length >= FILTER_FROM && (
            <TextField label="Filter" type="search" value={filter} onChange={(event) => setFilter(event.target.value)} className="min-w-40 max-w-80 flex-1" />
          )}
          <OrderField columns={columns} order={order} onOrder={setOrder} />
          {rows.length >= FILTER_FROM && (
            <p className="pb-2 text-ink2" role="status">
              {sorted.length} of {rows.length}
            </p>
          )}
        </div>
      )}
      <table role="table" className="w-full border-collapse">
        <caption className="sr-only">{caption}</caption>
        <thead role="rowgroup" className="card:hidden print:table-header-group">
          <tr role="row">
            {columns.map((column) => (
              <HeadCell key={column.key} column={column} order={order} onOrder={setOrder} />
            ))}
          </tr>
        </thead>
        <tbody role="rowgroup">
          {sorted.slice(0, shown).map((row) => (
            <BodyRow key={row.id} row={row} columns={columns} />
          ))}
        </tbody>
      </table>
      {sorted.length === 0 && <p className="px-4 py-6 text-ink2">{nothingFound}</p>}
      {sorted.length > shown && (
        <div className="px-4 py-3" data-no-print>
          <Button onClick={() => setShown(shown + PAGE)}>Show {Math.min(PAGE, sorted.length - shown)} more</Button>
        </div>
      )}
    </div>
  );
}

type OrderProps = { order: Order; onOrder: (order: Order) => void };

function HeadCell({ column, order, onOrder }: OrderProps & { column: Column }) {
  const on = order.key === column.key;
  return (
    <th role="columnheader" scope="col" aria-sort={!on ? "none" : order.descending ? "descending" : "ascending"} className="border-b-2 border-steel p-0 text-left">
      <button
        type="button"
        className={`flex min-h-11 w-full items-center gap-1.5 px-4 text-[1.05rem] font-semibold hover:bg-tint focus-visible:-outline-offset-2 ${column.numeric ? "flex-row-reverse" : ""}`}
        onClick={() => onOrder({ key: column.key, descending: on && !order.descending })}
      >
        {column.label}
        <svg viewBox="0 0 10 8" width="10" height="8" aria-hidden className={`shrink-0 ${on ? "" : "invisible"} ${order.descending ? "" : "rotate-180"}`}>
          <path d="M0 0H10L5 8Z" fill="currentColor" />
        </svg>
      </button>
    </th>
  );
}

/** Cards have no heads to press: on a phone the order is chosen here. */
function OrderField({ columns, order, onOrder }: OrderProps & { columns: readonly Column[] }) {
  return (
    <div className="flex items-end gap-2 md:hidden">
      <SelectField label="Sort by" value={order.key} onChange={(event) => onOrder({ ...order, key: event.target.value })}>
        {columns.map((column) => (
          <option key={column.key} value={column.key}>
            {column.label}
          </option>
        ))}
      </SelectField>
      <Button
        className="w-11 px-0!"
        aria-label={order.descending ? "From the last to the first; turn round" : "From the first to the last; turn round"}
        onClick={() => onOrder({ ...order, descending: !order.descending })}
      >
        <span aria-hidden>{order.descending ? "↓" : "↑"}</span>
      </Button>
    </div>
  );
}

function BodyRow({ row, columns }: { row: Row; columns: readonly Column[] }) {
  return (
    <tr role="row" className="border-b border-rule last:border-b-0 card:grid card:gap-1 card:px-4 card:py-3 md:hover:bg-tint">
      {columns.map((column, index) => (
        <td
          role="cell"
          key={column.key}
          className={`px-4 py-2.5 card:flex card:gap-2 card:p-0 ${index === 0 ? "card:text-[1.05rem] card:font-semibold" : ""} ${
            column.numeric ? "tabular text-right font-mono card:text-left" : ""
          }`}
        >
          {index > 0 && <span className="hidden w-32 shrink-0 font-sans text-ink2 card:inline">{column.label}</span>}
          <span className="min-w-0">{row.cells[column.key]?.show}</span>
        </td>
      ))}
    </tr>
  );
}
