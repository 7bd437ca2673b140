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

const HEXAGON = "50,19 77,34.5 77,65.5 50,81 23,65.5 23,34.5";
/** Below this the seat is left away and the head fills the picture, so that shape and number still tell. */
const SMALL_PX = 24;

/**
 * How a standing is drawn everywhere: what is held is the bolt, how far the next observation is marks it. Every state has a shape of its
 * own, so colour is never the only sign.
 */
export function Bolt({ standing, size = 44, label, drawn = false }: BoltProps) {
  const { held, next } = standing;
  const words = label ?? standingLabel(standing);
  const access = words === "" ? { "aria-hidden": true as const } : { role: "img", "aria-label": words };
  const small = size < SMALL_PX;
  const headed = held.kind !== "nothing" || isUnderWay(next);
  return (
    <svg viewBox="0 0 100 100" width={size} height={size} className="block shrink-0" {...access}>
      {headed && !small && <circle cx="50" cy="50" r="46" fill="var(--tint)" stroke="var(--steel)" strokeWidth="2.5" />}
      <g transform={small ? "translate(50 50) scale(1.38) translate(-50 -50)" : undefined}>
        {held.kind === "nothing" ? <Approach next={next} /> : <HeldBolt held={held} drawn={drawn} />}
      </g>
      {held.kind !== "nothing" && isUnderWay(next) && <NextMark next={next} small={small} />}
    </svg>
  );
}

/** Nothing is held yet: dashed ring, hole, or an outlined head with what comes next in it. */
function Approach({ next }: { next: Next }) {
  if (next === "not_open") {
    return <circle cx="50" cy="50" r="26" fill="none" stroke="var(--steel)" strokeWidth="5" pathLength="8" strokeDasharray="0.55 0.45" />;
  }
  if (next === "open") {
    return (
      <>
        <circle cx="50" cy="50" r="28" fill="var(--chalk)" stroke="var(--steel)" strokeWidth="4.5" />
        <circle cx="50" cy="50" r="18" fill="var(--ink2)" />
      </>
    );
  }
  return (
    <>
      <polygon points={HEXAGON} fill="var(--chalk)" stroke={next === "not_yet" ? "var(--ink)" : "var(--strong)"} strokeWidth="5" strokeLinejoin="round" />
      <NextSign next={next} />
    </>
  );
}

/** What stands on an outlined head. */
function NextSign({ next }: { next: Next }) {
  if (next === "ready") return <circle cx="50" cy="50" r="11.5" fill="var(--strong)" />;
  if (next === "booked") {
    return (
      <>
        <circle cx="50" cy="50" r="16" fill="none" stroke="var(--strong)" strokeWidth="4.5" />
        <circle cx="50" cy="50" r="7.5" fill="var(--strong)" />
      </>
    );
  }
  if (next === "not_yet") return <rect x="36" y="45.5" width="28" height="9" fill="var(--ink)" />;
  return null;
}

/** A filled head with its stamped level. Straight line: holds. Turned head and broken line: look again. Struck through: withdrawn. */
function HeldBolt({ held, drawn }: { held: Exclude<Held, { kind: "nothing" }>; drawn: boolean }) {
  if (held.kind === "withdrawn") {
    return (
      <>
        <polygon points={HEXAGON} fill="var(--steel)" stroke="var(--ink2)" strokeWidth="4" strokeLinejoin="round" />
        <path d="M18 82 82 18" stroke="var(--tint)" strokeWidth="14" />
        <path d="M18 82 82 18" stroke="var(--ink)" strokeWidth="8" />
      </>
    );
  }
  const due = held.kind === "recheck_due";
  return (
    <>
      <g transform={due ? "rotate(38 50 50)" : undefined}>
        <polygon points={HEXAGON} fill="var(--strong)" stroke="var(--strong)" strokeWidth="3" strokeLinejoin="round" />
        {due && <PaintLine path="M50 33V17" />}
      </g>
      {due ? <PaintLine path="M50 11V1" /> : <PaintLine path="M50 31V1" drawn={drawn} />}
      <text x="50" y="66" textAnchor="middle" fontFamily='"Barlow Condensed", sans-serif' fontWeight="600" fontSize="42" fill="var(--strong-ink)">
        {held.level}
      </text>
    </>
  );
}

/** Paint, with a bare edge that sets it off from the head. Runs from the head outwards, the way it is drawn. */
function PaintLine({ path, drawn = false }: { path: string; drawn?: boolean }) {
  return (
    <>
      <path d={path} stroke="var(--tint)" strokeWidth="16" />
      <path d={path} stroke="var(--line)" strokeWidth="11" pathLength="1" className={drawn ? "line-drawn" : undefined} />
    </>
  );
}

/** The small mark at the lower right of a held bolt. */
function NextMark({ next, small }: { next: Next; small: boolean }) {
  return (
    <g transform={small ? "translate(78 78) scale(1.25)" : "translate(80 80)"}>
      <circle r="17" fill="var(--chalk)" stroke="var(--strong)" strokeWidth="4" />
      {next === "ready" && <circle r="7" fill="var(--strong)" />}
      {next === "booked" && (
        <>
          <circle r="9.5" fill="none" stroke="var(--strong)" strokeWidth="3" />
          <circle r="4.5" fill="var(--strong)" />
        </>
      )}
      {next === "not_yet" && <rect x="-9" y="-3.5" width="18" height="7" fill="var(--ink)" />}
    </g>
  );
}
