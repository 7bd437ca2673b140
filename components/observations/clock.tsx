"use client";

import { useEffect, useState } from "react";
import { formatClock } from "@/lib/core/webvtt/timestamps";

/** How long the observation has been going. Empty until the browser knows the time, so that server and browser agree. */
export function Clock({ since }: { since: string }) {
  const [elapsed, setElapsed] = useState<number | null>(null);
  useEffect(() => {
    const tick = () => setElapsed(Math.max(0, Date.now() - new Date(since).getTime()));
    const timer = setInterval(tick, 1000);
    return () => clearInterval(timer);
  }, [since]);
  return (
    <span className="tabular font-mono text-[1.1rem]" role="timer" aria-label="Time since the sheet was opened">
      {elapsed === null ? "" : formatClock(elapsed)}
    </span>
  );
}
