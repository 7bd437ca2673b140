"use client";

import { useEffect, useRef } from "react";
import { isTyping } from "@/components/bench/keys";

/** What each key does. Names as the browser gives them, letters in lower case; "mod+" is Ctrl or Command. */
export type KeyActs = Record<string, () => void>;

/** Listens for the bench's keys on the whole page, but never while somebody types. */
export function useBenchKeys(acts: KeyActs): void {
  const latest = useRef(acts);
  useEffect(() => {
    latest.current = acts;
  });
  useEffect(() => {
    const onKey = (event: KeyboardEvent) => {
      if (isTyping(event.target) || event.altKey) return;
      const mod = event.ctrlKey || event.metaKey ? `mod+${event.shiftKey ? "shift+" : ""}` : "";
      const name = event.key.length === 1 ? event.key.toLowerCase() : event.key;
      const act = latest.current[`${mod}${name}`];
      // A focused button keeps the space bar for itself.
      if (!act || (event.key === " " && event.target instanceof HTMLButtonElement)) return;
      event.preventDefault();
      act();
    };
    window.addEventListener("keydown", onKey);
    return () => window.removeEventListener("keydown", onKey);
  }, []);
}
