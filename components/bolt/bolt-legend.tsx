import { Bolt } from "@/components/bolt/bolt";
import { standingLabel } from "@/lib/core/standing/standing-label";
import type { Held, Next, Standing } from "@/lib/core/standing/types";

const NOTHING: Held = { kind: "nothing" };
const LEVEL: Held = { kind: "level", level: 3, until: "2027-12-01" };
const next = (state: Next): Standing => ({ held: NOTHING, next: state });

/** Every state once: what is not held yet, what is held, and what is held while the next observation is under way. */
export const LEGEND: { standing: Standing; words: string }[] = [
  { standing: next("not_open"), words: "Not open yet: learn its module first" },
  { standing: next("open"), words: "Open, not begun" },
  { standing: next("practising"), words: "Practising" },
  { standing: next("ready"), words: "Ready to be observed" },
  { standing: next("booked"), words: "Booked to be observed" },
  { standing: next("not_yet"), words: "Observed: not yet" },
  { standing: { held: LEVEL, next: "open" }, words: "Signed off and current; the number is the supervision level" },
  { standing: { held: { kind: "recheck_due", level: 4, because: "expired" }, next: "open" }, words: "Re-check due; the number is the level it had" },
  { standing: { held: { kind: "withdrawn", level: 3 }, next: "open" }, words: "Withdrawn" },
  { standing: { held: LEVEL, next: "practising" }, words: "Held, and practising for the next observation" },
  { standing: { held: LEVEL, next: "ready" }, words: "Held, and ready to be observed again" },
  { standing: { held: LEVEL, next: "booked" }, words: "Held, and booked" },
  { standing: { held: LEVEL, next: "not_yet" }, words: "Held; the last observation came to not yet" },
];

export function BoltLegend({ size = 52 }: { size?: number }) {
  return (
    <ul className="grid gap-x-6 gap-y-3 sm:grid-cols-2">
      {LEGEND.map(({ standing, words }) => (
        <li key={words} className="flex items-center gap-4">
          <Bolt standing={standing} size={size} label={standingLabel(standing)} />
          <span>{words}</span>
        </li>
      ))}
    </ul>
  );
}
