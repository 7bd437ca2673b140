import { standingLabel, isUnderWay } from "@/lib/core/standing/standing-label";
import type { Held, Next, Standing } from "@/lib/core/standing/types";

type BoltProps = {
  standing: Standing;
  /** Width and height in CSS pixels, 16–200. */
  size?: number;
  /** Words for screen readers in place of the standing's own; empty when words stand beside it anyway. */
  label?: string;
  /** Draws the paint line once, when a sign-off has just been made. */
  drawn?: boolean;
};

const HEXAGON = "50,20 76,35 76,65 50,80 24,65 24,35";

/**
 * How a standing is drawn everywhere: what is held is the bolt, how far the next observation is marks it. Every state has a shape of its
 * own, so colour is never the only sign.
 */
export function Bolt({ standing, size = 44, label, drawn = false }: BoltProps) {
  const { held, next } = standing;
  const words = label ?? standingLabel(standing);
  const access = words === "" ? { "aria-hidden": true as const } : { role: "img", "aria-label": words };
  return (
    <svg viewBox="0 0 100 100" width={size} height={size} className="block shrink-0" {...access}>
      {held.kind === "nothing" ? <Approach next={next} /> : <HeldBolt held={held} drawn={drawn} />}
      {held.kind !== "nothing" && isUnderWay(next) && <NextMark next={next} />}
    </svg>
  );
}

const Seat = () => <circle cx="50" cy="50" r="45" fill="var(--tint)" stroke="var(--steel)" strokeWidth="3" />;

/** Nothing is held yet: dashed ring, hole, or an outlined head with what comes next in it. */
function Approach({ next }: { next: Next }) {
  if (next === "not_open") {
    return <circle cx="50" cy="50" r="30" fill="none" stroke="var(--steel)" strokeWidth="6" strokeDasharray="11 8" />;
  }
  if (next === "open") {
    return (
      <>
        <circle cx="50" cy="50" r="33" fill="var(--chalk)" stroke="var(--steel)" strokeWidth="5" />
        <circle cx="50" cy="50" r="21" fill="var(--ink2)" />
      </>
    );
  }
  return (
    <>
      <Seat />
      <polygon points={HEXAGON} fill="var(--chalk)" stroke="var(--strong)" strokeWidth="6" strokeLinejoin="round" />
      <NextSign next={next} />
    </>
  );
}

/** What stands on an outlined head. */
function NextSign({ next }: { next: Next }) {
  if (next === "ready") return <circle cx="50" cy="50" r="10" fill="var(--strong)" />;
  if (next === "booked") {
    return (
      <>
        <circle cx="50" cy="50" r="15" fill="none" stroke="var(--strong)" strokeWidth="4.5" />
        <circle cx="50" cy="50" r="7" fill="var(--strong)" />
      </>
    );
  }
  if (next === "not_yet") return <rect x="35" y="45" width="30" height="10" fill="var(--ink)" />;
  return null;
}

/** A filled head with its stamped level. Straight line: holds. Turned head and broken line: look again. Struck through: withdrawn. */
function HeldBolt({ held, drawn }: { held: Exclude<Held, { kind: "nothing" }>; drawn: boolean }) {
  if (held.kind === "withdrawn") {
    return (
      <>
        <Seat />
        <polygon points={HEXAGON} fill="var(--steel)" stroke="var(--ink2)" strokeWidth="4" strokeLinejoin="round" />
        <path d="M16 84 L84 16" stroke="var(--ink)" strokeWidth="9" />
      </>
    );
  }
  const due = held.kind === "recheck_due";
  return (
    <>
      <Seat />
      <polygon points={HEXAGON} fill="var(--strong)" transform={due ? "rotate(22 50 50)" : undefined} />
      {due ? (
        <path d="M50 2 V16 M61 20 L58 34" stroke="var(--line)" strokeWidth="10" />
      ) : (
        <path d="M50 2 V32" stroke="var(--line)" strokeWidth="10" className={drawn ? "line-drawn" : undefined} />
      )}
      <text
        x="50"
        y="65"
        textAnchor="middle"
        fontFamily='"Barlow Condensed", sans-serif'
        fontWeight="600"
        fontSize="37"
        fill="var(--strong-ink)"
        transform={due ? "rotate(10 50 50)" : undefined}
      >
        {held.level}
      </text>
    </>
  );
}

/** The small mark at the lower right of a held bolt. */
function NextMark({ next }: { next: Next }) {
  return (
    <>
      <circle cx="80" cy="80" r="18" fill="var(--chalk)" stroke="var(--strong)" strokeWidth="4.5" />
      {next === "ready" && <circle cx="80" cy="80" r="7" fill="var(--strong)" />}
      {next === "booked" && (
        <>
          <circle cx="80" cy="80" r="10" fill="none" stroke="var(--strong)" strokeWidth="3" />
          <circle cx="80" cy="80" r="4.5" fill="var(--strong)" />
        </>
      )}
      {next === "not_yet" && <rect x="71" y="76.5" width="18" height="7" fill="var(--ink)" />}
    </>
  );
}
