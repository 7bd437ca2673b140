import type { Level } from "@/lib/core/tasks/types";

/** What a person holds on a task. Dates are ISO days (yyyy-mm-dd). */
export type Held =
  | { kind: "nothing" }
  | { kind: "level"; level: Level; until: string }
  | { kind: "recheck_due"; level: Level; because: "expired" | "work_changed" }
  | { kind: "withdrawn"; level: Level };

/** How far the next observation is. */
export const NEXT_STATES = ["not_open", "open", "practising", "ready", "booked", "not_yet"] as const;
export type Next = (typeof NEXT_STATES)[number];

/** A person's standing on a task is two facts; the bolt shows the first and marks the second. */
export type Standing = { held: Held; next: Next };
