import { formatDay } from "@/lib/core/dates";
import type { Held, Next, Standing } from "@/lib/core/standing/types";

const NEXT_LABEL: Record<Next, string> = {
  not_open: "not open yet",
  open: "open",
  practising: "practising",
  ready: "ready to be observed",
  booked: "booked to be observed",
  not_yet: "not yet",
};

function heldLabel(held: Held): string | null {
  switch (held.kind) {
    case "nothing":
      return null;
    case "level":
      return `signed off, level ${held.level}, until ${formatDay(held.until)}`;
    case "recheck_due":
      return `re-check due, was level ${held.level}${held.because === "work_changed" ? ", the work changed" : ""}`;
    case "withdrawn":
      return `withdrawn, was level ${held.level}`;
  }
}

/** Whether the next observation is worth a mark beside what is held. */
export function isUnderWay(next: Next): boolean {
  return next === "practising" || next === "ready" || next === "booked" || next === "not_yet";
}

/** A standing in words, for screen readers, tables and exports. */
export function standingLabel({ held, next }: Standing): string {
  const holds = heldLabel(held);
  const words = holds === null ? NEXT_LABEL[next] : isUnderWay(next) ? `${holds} · ${NEXT_LABEL[next]}` : holds;
  return words.charAt(0).toUpperCase() + words.slice(1);
}
