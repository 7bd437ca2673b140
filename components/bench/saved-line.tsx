"use client";

import { useEffect, useState } from "react";
import type { SavingState } from "@/components/bench/use-saving";

/** Where the work is: a state that one can trust. */
export function SavedLine({ state }: { state: SavingState }) {
  const [now, setNow] = useState<number | null>(null);
  useEffect(() => {
    const timer = setInterval(() => setNow(Date.now()), 1000);
    return () => clearInterval(timer);
  }, []);
  return <span role="status">{wordsFor(state, now)}</span>;
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
      return "not saved: changed elsewhere";
    case "saved": {
      if (state.at === null) return "as it was saved";
      const seconds = Math.max(0, Math.round(((now ?? state.at) - state.at) / 1000));
      return seconds < 60 ? `saved ${seconds} s ago` : `saved ${Math.round(seconds / 60)} min ago`;
    }
  }
}
