import Link from "next/link";
import { memo, type ReactNode } from "react";
import { Bolt } from "@/components/bolt/bolt";
import { standingLabel } from "@/lib/core/standing/standing-label";
import type { Standing } from "@/lib/core/standing/types";

export type PlateColumn = { id: string; label: string; title: string };
export type PlateLine = { id: string; name: string; sub: string; href: string | null; standings: Standing[]; tail: ReactNode };

export const ROW_PX = 48;

type PlateRowProps = {
  line: PlateLine;
  columns: PlateColumn[];
  row: number;
  /** Column that the Tab key stops at in this row; null in every other row. */
  stop: number | null;
  /** Whether its bolt is the one that is read. */
  lit: boolean;
};

/** One person and their bolts. Drawn again only when the place on the plate comes to this row or leaves it. */
export const PlateRow = memo(function PlateRow({ line, columns, row, stop, lit }: PlateRowProps) {
  const name = <span className="font-semibold">{line.name}</span>;
  return (
    <tr aria-rowindex={row + 2} style={{ height: ROW_PX }} className="group">
      <th
        scope="row"
        className={`sticky left-0 z-10 max-w-44 whitespace-nowrap border-b border-r-2 border-b-rule border-r-steel px-3 text-left sm:px-4 font-sans text-base font-normal group-hover:bg-tint sm:max-w-none print:px-1 ${
          lit ? "bg-tint" : "bg-sheet"
        }`}
      >
        {line.href ? (
          <Link href={line.href} className="inline-flex min-h-11 items-center underline underline-offset-4">
            {name}
          </Link>
        ) : (
          name
        )}{" "}
        <span className="text-ink2 max-sm:block max-sm:truncate max-sm:text-sm">{line.sub}</span>
      </th>
      {line.standings.map((standing, column) => (
        <td key={columns[column]?.id} className="h-12 w-12 min-w-12 border-b border-r border-rule p-0 group-hover:bg-tint print:w-9 print:min-w-9">
          <button
            type="button"
            data-cell={`${row}-${column}`}
            tabIndex={column === stop ? 0 : -1}
            aria-label={`${line.name}, ${columns[column]?.title}: ${standingLabel(standing)}`}
            title={standingLabel(standing)}
            className="grid size-full min-h-11 place-items-center focus-visible:-outline-offset-2"
          >
            <Bolt standing={standing} size={36} label="" />
          </button>
        </td>
      ))}
      <td className="whitespace-nowrap border-b border-rule px-4 group-hover:bg-tint print:px-1">{line.tail}</td>
    </tr>
  );
});
