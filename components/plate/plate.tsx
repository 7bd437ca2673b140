"use client";

import { useVirtualizer } from "@tanstack/react-virtual";
import Link from "next/link";
import { useRef, useState, type KeyboardEvent, type ReactNode } from "react";
import { Bolt } from "@/components/bolt/bolt";
import { standingLabel } from "@/lib/core/standing/standing-label";
import type { Standing } from "@/lib/core/standing/types";

export type PlateColumn = { id: string; label: string; title: string };
export type PlateLine = { id: string; name: string; sub: string; href: string | null; standings: Standing[]; tail: ReactNode };

type PlateProps = { caption: string; columns: PlateColumn[]; lines: PlateLine[]; tailLabel: string };

const ROW_PX = 48;
/** Below this, every row is drawn: print and search in the page then find all of them. */
const WINDOW_FROM = 80;

/**
 * People × tasks as bolts on an engraved grid with sticky heads. One stop of the Tab key; arrow keys move from bolt to bolt, and the
 * bolt's words are told below and to screen readers. Thousands of rows cost no more than those in sight.
 */
export function Plate({ caption, columns, lines, tailLabel }: PlateProps) {
  const scroller = useRef<HTMLDivElement>(null);
  const [at, setAt] = useState({ row: 0, column: 0 });
  const windowed = lines.length > WINDOW_FROM;
  // eslint-disable-next-line react-hooks/incompatible-library -- the virtualizer's functions change on every scroll, as they must
  const virtual = useVirtualizer({ count: lines.length, getScrollElement: () => scroller.current, estimateSize: () => ROW_PX, overscan: 12, enabled: windowed });
  const items = windowed ? virtual.getVirtualItems().map((item) => item.index) : lines.map((_, index) => index);
  const first = items[0] ?? 0;
  const last = items.at(-1) ?? -1;

  const go = (row: number, column: number) => {
    const next = { row: Math.min(Math.max(row, 0), lines.length - 1), column: Math.min(Math.max(column, 0), columns.length - 1) };
    setAt(next);
    if (windowed) virtual.scrollToIndex(next.row);
    requestAnimationFrame(() => scroller.current?.querySelector<HTMLElement>(`[data-cell="${next.row}-${next.column}"]`)?.focus());
  };
  const onKeyDown = (event: KeyboardEvent) => {
    const moves: Record<string, [number, number]> = {
      ArrowUp: [at.row - 1, at.column],
      ArrowDown: [at.row + 1, at.column],
      ArrowLeft: [at.row, at.column - 1],
      ArrowRight: [at.row, at.column + 1],
      Home: [at.row, 0],
      End: [at.row, columns.length - 1],
      PageUp: [at.row - 10, at.column],
      PageDown: [at.row + 10, at.column],
    };
    const move = moves[event.key];
    if (!move) return;
    event.preventDefault();
    go(...move);
  };
  const here = lines[at.row]?.standings[at.column];
  return (
    <div>
      <div ref={scroller} className="max-h-[75dvh] overflow-auto print:max-h-none print:overflow-visible" onKeyDown={onKeyDown} tabIndex={-1}>
        <table role="grid" aria-label={caption} aria-rowcount={lines.length + 1} aria-colcount={columns.length + 2} className="border-separate border-spacing-0">
          <thead>
            <tr>
              <th scope="col" className="sticky left-0 top-0 z-20 border-b-2 border-r-2 border-steel bg-sheet px-4 pb-2 text-left align-bottom">
                Apprentice
              </th>
              {columns.map((column) => (
                <th key={column.id} scope="col" title={column.title} className="sticky top-0 z-10 h-36 border-b-2 border-r border-b-steel border-r-rule bg-sheet align-bottom">
                  <span className="mx-auto my-2 block h-32 rotate-180 whitespace-nowrap text-left text-[1.05rem] [writing-mode:vertical-rl]">{column.label}</span>
                </th>
              ))}
              <th scope="col" className="sticky top-0 z-10 border-b-2 border-steel bg-sheet px-4 pb-2 text-left align-bottom">
                {tailLabel}
              </th>
            </tr>
          </thead>
          <tbody>
            {windowed && first > 0 && <Spacer height={first * ROW_PX} />}
            {items.map((row) => {
              const line = lines[row];
              if (!line) return null;
              return (
                <tr key={line.id} aria-rowindex={row + 2} style={{ height: ROW_PX }}>
                  <th scope="row" className="sticky left-0 z-10 max-w-40 whitespace-nowrap border-b border-r-2 border-b-rule border-r-steel bg-sheet px-4 text-left font-sans text-base font-semibold sm:max-w-none">
                    {line.href ? (
                      <Link href={line.href} className="underline-offset-4 hover:underline">
                        {line.name}
                      </Link>
                    ) : (
                      line.name
                    )}{" "}
                    <span className="font-normal text-ink2 max-sm:block max-sm:truncate max-sm:text-sm">{line.sub}</span>
                  </th>
                  {line.standings.map((standing, column) => {
                    const isAt = row === at.row && column === at.column;
                    return (
                      <td
                        key={columns[column]?.id}
                        data-cell={`${row}-${column}`}
                        tabIndex={isAt ? 0 : -1}
                        aria-label={`${line.name}, ${columns[column]?.title}: ${standingLabel(standing)}`}
                        title={standingLabel(standing)}
                        onFocus={() => setAt({ row, column })}
                        onClick={() => setAt({ row, column })}
                        className="h-12 w-12 min-w-12 border-b border-r border-rule p-0 focus-visible:-outline-offset-2"
                      >
                        <span className="grid place-items-center">
                          <Bolt standing={standing} size={34} label="" />
                        </span>
                      </td>
                    );
                  })}
                  <td className="whitespace-nowrap border-b border-rule px-4">{line.tail}</td>
                </tr>
              );
            })}
            {windowed && last < lines.length - 1 && <Spacer height={(lines.length - 1 - last) * ROW_PX} />}
          </tbody>
        </table>
      </div>
      {here && (
        <p className="border-t border-rule px-4 py-2.5" data-no-print>
          <span className="font-semibold">{lines[at.row]?.name}</span>, {columns[at.column]?.title}: {standingLabel(here)}
        </p>
      )}
    </div>
  );
}

function Spacer({ height }: { height: number }) {
  return (
    <tr aria-hidden style={{ height }}>
      <td />
    </tr>
  );
}
