"use client";

import { useVirtualizer } from "@tanstack/react-virtual";
import { useEffect, useRef, useState, type KeyboardEvent, type SyntheticEvent } from "react";
import { flushSync } from "react-dom";
import { PlateRow, ROW_PX, type PlateColumn, type PlateLine } from "@/components/plate/plate-row";
import { standingLabel } from "@/lib/core/standing/standing-label";

type PlateProps = { caption: string; columns: PlateColumn[]; lines: PlateLine[]; tailLabel: string };
type Place = { row: number; column: number };

/** Below this, every row is drawn: a search in the page then finds all of them. */
const WINDOW_FROM = 80;
/** The heads, h-40: they stay above the rows and cover those that scroll under them. */
const HEAD_PX = 160;
/** What a plate shows before its real height is known. */
const FIRST_RECT = { width: 1000, height: 900 };

/**
 * People × tasks as bolts on an engraved grid with sticky heads. One stop of the Tab key; arrow keys move from bolt to bolt, and the
 * bolt's words are told below and to screen readers. Thousands of rows cost no more than those in sight; on paper all of them come.
 */
export function Plate({ caption, columns, lines, tailLabel }: PlateProps) {
  const scroller = useRef<HTMLDivElement>(null);
  const [at, setAt] = useState<Place>({ row: 0, column: 0 });
  const [chosen, setChosen] = useState(false);
  const windowed = !usePrinting() && lines.length > WINDOW_FROM;
  // eslint-disable-next-line react-hooks/incompatible-library -- the virtualizer's functions change on every scroll, as they must
  const virtual = useVirtualizer({
    count: lines.length,
    getScrollElement: () => scroller.current,
    estimateSize: () => ROW_PX,
    overscan: 12,
    initialRect: FIRST_RECT,
    scrollMargin: HEAD_PX,
    scrollPaddingStart: HEAD_PX,
    enabled: windowed,
  });
  const rows = windowed ? virtual.getVirtualItems().map((item) => item.index) : lines.map((_, index) => index);
  const first = rows[0] ?? 0;
  const last = rows.at(-1) ?? -1;
  // Scrolled away from, the place is still one press of Tab away.
  const stopRow = rows.includes(at.row) ? at.row : first;

  const go = (row: number, column: number) => {
    const next = { row: Math.min(Math.max(row, 0), lines.length - 1), column: Math.min(Math.max(column, 0), columns.length - 1) };
    setAt(next);
    if (windowed) virtual.scrollToIndex(next.row);
    requestAnimationFrame(() => scroller.current?.querySelector<HTMLElement>(`[data-cell="${next.row}-${next.column}"]`)?.focus());
  };
  const onKeyDown = (event: KeyboardEvent) => {
    const to = moveFor(event, at, { row: lines.length - 1, column: columns.length - 1 });
    if (!to) return;
    event.preventDefault();
    go(to.row, to.column);
  };
  const onTouch = (event: SyntheticEvent) => {
    const place = placeOf(event.target);
    if (!place) return;
    setAt(place);
    setChosen(true);
  };
  const here = lines[at.row]?.standings[at.column];
  return (
    <div className="plate">
      <div
        ref={scroller}
        className="isolate max-h-[75dvh] scroll-pl-44 scroll-pt-44 overflow-auto print:max-h-none print:overflow-visible"
        onKeyDown={onKeyDown}
        onFocus={onTouch}
        onClick={onTouch}
        tabIndex={-1}
      >
        <table role="grid" aria-label={caption} aria-rowcount={lines.length + 1} aria-colcount={columns.length + 2} className="border-separate border-spacing-0">
          <thead>
            <tr aria-rowindex={1}>
              <th scope="col" className="sticky left-0 top-0 z-20 border-b-2 border-r-2 border-steel bg-sheet px-4 pb-2 text-left align-bottom print:px-1">
                Apprentice
              </th>
              {columns.map((column, index) => (
                <th
                  key={column.id}
                  scope="col"
                  title={column.title}
                  className={`sticky top-0 z-10 h-40 border-b-2 border-r border-b-steel border-r-rule px-0 align-bottom ${chosen && index === at.column ? "bg-tint" : "bg-sheet"}`}
                >
                  <span className="mb-2 ml-auto mr-auto mt-2 block h-36 rotate-180 overflow-hidden text-ellipsis whitespace-nowrap text-left text-[1.05rem] [writing-mode:vertical-rl]">
                    {column.label}
                  </span>
                </th>
              ))}
              <th scope="col" className="sticky top-0 z-10 border-b-2 border-steel bg-sheet px-4 pb-2 text-left align-bottom print:px-1">
                {tailLabel}
              </th>
            </tr>
          </thead>
          <tbody>
            {first > 0 && <Spacer height={first * ROW_PX} />}
            {rows.map((row) => {
              const line = lines[row];
              return line && <PlateRow key={line.id} line={line} columns={columns} row={row} stop={row === stopRow ? at.column : null} lit={chosen && row === at.row} />;
            })}
            {last < lines.length - 1 && <Spacer height={(lines.length - 1 - last) * ROW_PX} />}
          </tbody>
        </table>
      </div>
      <p className={`border-t border-rule bg-sheet px-4 py-2.5 ${chosen ? "sticky bottom-15 md:bottom-0" : "text-ink2"}`} data-no-print>
        {chosen && here ? (
          <>
            <span className="font-semibold">{lines[at.row]?.name}</span>, {columns[at.column]?.title}: {standingLabel(here)}
          </>
        ) : (
          "Press a bolt to read it here."
        )}
      </p>
    </div>
  );
}

/** Rows out of sight keep their height, so that the scroll bar tells the truth. */
function Spacer({ height }: { height: number }) {
  return (
    <tr aria-hidden style={{ height }}>
      <td />
    </tr>
  );
}

/** Where a key leads from `at`; undefined for keys that are not the plate's. Keys as in the grid pattern of the ARIA authoring practices. */
function moveFor({ key, ctrlKey }: KeyboardEvent, at: Place, end: Place): Place | undefined {
  const moves: Record<string, Place> = {
    ArrowUp: { ...at, row: at.row - 1 },
    ArrowDown: { ...at, row: at.row + 1 },
    ArrowLeft: { ...at, column: at.column - 1 },
    ArrowRight: { ...at, column: at.column + 1 },
    Home: { row: ctrlKey ? 0 : at.row, column: 0 },
    End: { row: ctrlKey ? end.row : at.row, column: end.column },
    PageUp: { ...at, row: at.row - 10 },
    PageDown: { ...at, row: at.row + 10 },
  };
  return moves[key];
}

function placeOf(target: EventTarget): Place | undefined {
  const [row, column] = ((target as Element).closest<HTMLElement>("[data-cell]")?.dataset.cell ?? "").split("-").map(Number);
  return row === undefined || column === undefined ? undefined : { row, column };
}

/** Whether the page is being put on paper right now. */
function usePrinting(): boolean {
  const [printing, setPrinting] = useState(false);
  useEffect(() => {
    // At once: the browser takes its picture as soon as the event returns.
    const begin = () => flushSync(() => setPrinting(true));
    const end = () => setPrinting(false);
    window.addEventListener("beforeprint", begin);
    window.addEventListener("afterprint", end);
    return () => {
      window.removeEventListener("beforeprint", begin);
      window.removeEventListener("afterprint", end);
    };
  }, []);
  return printing;
}
