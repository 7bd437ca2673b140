"use client";

import { useEffect, useState } from "react";
import type { Unfinished } from "@/components/bench/keepable";
import type { SavingState } from "@/components/bench/use-saving";
import { formatDay } from "@/lib/core/dates";

/** Where the work is: a state that one can trust. Read out only when it changes, not every second. */
export function SavedLine({ state, unfinished }: { state: SavingState; unfinished: Unfinished[] }) {
  const [now, setNow] = useState<number | null>(null);
  useEffect(() => {
    const timer = setInterval(() => setNow(Date.now()), 1000);
    return () => clearInterval(timer);
  }, []);
  const words = wordsFor(state, now);
  return (
    <span className="whitespace-nowrap">
      <span aria-hidden>
        {words}
        {state.kind === "saved" && unfinished.length > 0 && `, ${unfinished.length} not finished`}
      </span>
      <span role="status" className="sr-only">
        {state.kind === "saved" ? "saved" : words}
      </span>
    </span>
  );
}

function wordsFor(state: SavingState, now: number | null): string {
  switch (state.kind) {
    case "saving":
      return "being saved";
    case "offline":
      return "offline: kept here";
    case "refused":
      return "not saved: see below";
    case "conflict":
      return "kept here: saved elsewhere too";
    case "saved":
      return state.at === null ? "nothing to save yet" : `saved${now === null ? "" : ` ${ago(state.at, now)}`}`;
  }
}

function ago(at: number, now: number): string {
  const ms = Math.max(0, now - at);
  const [seconds, minutes, hours] = [Math.round(ms / 1000), Math.round(ms / 60_000), Math.round(ms / 3_600_000)];
  if (seconds < 60) return `${seconds} s ago`;
  if (minutes < 60) return `${minutes} min ago`;
  return hours < 24 ? `${hours} h ago` : formatDay(new Date(at).toISOString().slice(0, 10));
}
