import type { ReactNode } from "react";

/** A small engraved label. */
export function Tag({ children, kind = "plain" }: { children: ReactNode; kind?: "plain" | "safety" | "strong" }) {
  const look = {
    plain: "border-steel bg-chalk text-ink2",
    safety: "border-caution bg-caution text-caution-ink",
    strong: "border-strong bg-strong text-strong-ink",
  }[kind];
  return <span className={`inline-block rounded border px-1.5 font-plate text-[0.95rem] font-semibold leading-snug ${look}`}>{children}</span>;
}

/** A key of the keyboard, shown where it works. */
export function KeyCap({ children }: { children: ReactNode }) {
  return (
    <kbd className="rounded border border-b-2 border-steel bg-chalk px-1.5 font-mono text-[0.8rem] font-semibold leading-snug text-ink">{children}</kbd>
  );
}

/** A reading, code or time: tabular figures that never break from their unit. */
export function Value({ children, className = "" }: { children: ReactNode; className?: string }) {
  return <span className={`tabular whitespace-nowrap font-mono ${className}`}>{children}</span>;
}
