"use client";

import { useEffect, useRef } from "react";
import { isTyping } from "@/components/bench/keys";

/** What each key does. Names as the browser gives them, letters in lower case; "mod+" is Ctrl or Command. */
export type KeyActs = Record<string, () => void>;

/** Press and hold of one key, each with its own meaning. */
export type Held = { press: () => void; hold: () => void; release: () => void };

/** Longer than a press. */
const HOLD_MS = 280;

/** Listens for the bench's keys on the whole page, but never while somebody types. */
export function useBenchKeys(acts: KeyActs, held: Record<string, Held>): void {
  const latest = useRef({ acts, held });
  useEffect(() => {
    latest.current = { acts, held };
  });
  useEffect(() => {
    let down: { name: string; timer: ReturnType<typeof setTimeout>; holding: boolean } | null = null;
    const onDown = (event: KeyboardEvent) => {
      if (isTyping(event.target) || event.altKey) return;
      const mod = event.ctrlKey || event.metaKey ? `mod+${event.shiftKey ? "shift+" : ""}` : "";
      const name = event.key.length === 1 ? event.key.toLowerCase() : event.key;
      if (mod === "" && latest.current.held[name]) {
        event.preventDefault();
        if (event.repeat || down) return;
        const timer = setTimeout(() => {
          if (down) down.holding = true;
          latest.current.held[name]?.hold();
        }, HOLD_MS);
        down = { name, timer, holding: false };
        return;
      }
      const act = latest.current.acts[`${mod}${name}`];
      // What the space bar presses, and boxes that it ticks, keep it for themselves.
      if (!act || (event.key === " " && event.target instanceof HTMLElement && event.target.matches("button, a, summary, input"))) return;
      event.preventDefault();
      act();
    };
    const end = (event: KeyboardEvent | FocusEvent) => {
      if (!down || (event instanceof KeyboardEvent && event.key.toLowerCase() !== down.name)) return;
      clearTimeout(down.timer);
      const keys = latest.current.held[down.name];
      if (down.holding) keys?.release();
      else if (event instanceof KeyboardEvent) keys?.press();
      down = null;
    };
    window.addEventListener("keydown", onDown);
    window.addEventListener("keyup", end);
    window.addEventListener("blur", end);
    return () => {
      window.removeEventListener("keydown", onDown);
      window.removeEventListener("keyup", end);
      window.removeEventListener("blur", end);
    };
  }, []);
}
