import type { ReactNode } from "react";
import type { Caution } from "@/lib/core/steps/types";

const GRADE_LABEL = { caution: "Caution", warning: "Warning", danger: "Danger" } as const;

/** Drawn by us: a triangle with a stroke and a dot. The graver, the heavier: a thin edge, a thick edge, filled. */
export function CautionSign({ grade = "caution", size = 36 }: { grade?: Caution["grade"]; size?: number }) {
  const filled = grade === "danger";
  return (
    <svg viewBox="0 0 40 36" width={size} height={size * 0.9} aria-hidden className="shrink-0">
      <path d="M20 3 37 33H3Z" fill={filled ? "currentColor" : "none"} stroke="currentColor" strokeWidth={grade === "caution" ? 2.5 : 5} strokeLinejoin="round" />
      <path d="M20 13v10M20 26.5v3.5" stroke={filled ? "var(--caution)" : "currentColor"} strokeWidth="3.5" />
    </svg>
  );
}

/** The one yellow thing of the product, used for nothing but cautions. It always defers to the maker's data, local rules and licensed practice. */
export function CautionPlate({ caution, children }: { caution: Pick<Caution, "grade" | "hazard" | "instruction">; children?: ReactNode }) {
  return (
    <div data-keep className="flex items-start gap-3 rounded bg-caution px-4 py-3 text-caution-ink">
      <CautionSign grade={caution.grade} />
      <div>
        <p className="font-plate text-[1.15rem] font-semibold leading-tight">
          {GRADE_LABEL[caution.grade]}: {caution.hazard}
        </p>
        <p>{caution.instruction}</p>
        <p className="mt-1 text-sm">Maker’s data for this vehicle, local rules and licensed practice come first.</p>
        {children}
      </div>
    </div>
  );
}

/** On every screen of a demo organisation that shows a value. */
export function DemoBanner() {
  return (
    <aside aria-label="Demonstration" className="border-b border-rule bg-chalk px-4 py-1.5 text-center text-sm text-ink2 sm:px-6">
      Demonstration values – invented. Never use on a real vehicle. Maker’s data rules.
    </aside>
  );
}
