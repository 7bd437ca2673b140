import type { OrganisationKey } from "@/db/seeds/demo/cast";
import type { DemoTaskKey } from "@/db/seeds/demo/tasks";

/**
 * Where each apprentice stands on each task on the demo's day, in the order of a plate. One code a task:
 * a level 1–5 that is current, `e` before it: ran out, `w`: withdrawn; then what comes next: `.` nothing under way, `x` not open,
 * `o` open, `p` practising, `r` ready, `b` booked, `n` not yet. The wheel bearing's work changed: every level on it is due again.
 */
export const STANDINGS: Record<string, string> = {
  //       lift road disc drum bear tyre belt cool batt clut lamp refr serv
  asha: "   3.   3r   r    o    o    4.   x    o    p    n    o    o    p",
  tomasz: " 5.   4.   3r   4.   3.   5.   4.   3.   b    2.   4.   o    3n",
  niamh: "  5.   5.   4.   e4.  4r   5.   5.   4.   4.   3.   5.   2.   4.",
  joss: "   4.   3.   x    n    o    3.   x    w3r  p    o    3.   o    o",
  orla: "   3.   2.   p    o    o    3.   3.   o    o    r    2.   o    p",
  milo: "   5.   4b   4.   3.   2.   4.   e3.  3.   4.   n    4.   o    3.",
  lowri: "  3.   n    o    o    o    2.   o    p    o    o    o    o    o",
  ewan: "   5.   5.   4n   4.   4.   5.   4.   4.   5.   4.   5.   2.   4r",
};

export const TASK_ORDER: DemoTaskKey[] = [
  "lift-induction",
  "road-wheel",
  "front-brake-discs",
  "rear-drum-brakes",
  "wheel-bearing",
  "tyre-pressure-sensor",
  "auxiliary-belt",
  "cooling-pressure-test",
  "battery-drain",
  "clutch-hydraulics",
  "headlamp-aim",
  "refrigerant-recovery",
  "service-inspection",
];

export type HeldCode = { level: 1 | 2 | 3 | 4 | 5; ranOut: boolean; withdrawn: boolean } | null;
export type NextCode = "not_open" | "open" | "practising" | "ready" | "booked" | "not_yet";
export type PlannedStanding = { held: HeldCode; next: NextCode };

const NEXT: Record<string, NextCode> = { ".": "open", x: "not_open", o: "open", p: "practising", r: "ready", b: "booked", n: "not_yet" };

/** What one code means. */
export function readCode(code: string): PlannedStanding {
  const match = /^([ew]?)([1-5]?)([.xoprbn]?)$/.exec(code);
  const next = match && NEXT[match[3] || "."];
  if (!match || !next) throw new Error(`“${code}” is not a standing.`);
  const level = match[2] ? (Number(match[2]) as 1 | 2 | 3 | 4 | 5) : null;
  return { held: level && { level, ranOut: match[1] === "e", withdrawn: match[1] === "w" }, next };
}

/** Planned standing of everybody on everything. */
export function plannedStandings(): { apprentice: string; task: DemoTaskKey; planned: PlannedStanding }[] {
  return Object.entries(STANDINGS).flatMap(([apprentice, codes]) =>
    codes
      .trim()
      .split(/\s+/)
      .map((code, index) => {
        const task = TASK_ORDER[index];
        if (!task) throw new Error(`${apprentice} has more codes than there are tasks.`);
        return { apprentice, task, planned: readCode(code) };
      }),
  );
}

/** Where each apprentice trains today. */
export const WORKSHOP_OF: Record<string, Extract<OrganisationKey, "vennick" | "saltmarsh">> = {
  asha: "vennick",
  tomasz: "vennick",
  niamh: "vennick",
  joss: "vennick",
  orla: "saltmarsh",
  milo: "saltmarsh",
  lowri: "saltmarsh",
  ewan: "saltmarsh",
};
