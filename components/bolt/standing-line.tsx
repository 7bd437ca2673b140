import { Bolt } from "@/components/bolt/bolt";
import { standingLabel } from "@/lib/core/standing/standing-label";
import type { Standing } from "@/lib/core/standing/types";

/** A bolt with its words beside it. */
export function StandingLine({ standing, size = 44, drawn = false }: { standing: Standing; size?: number; drawn?: boolean }) {
  return (
    <span className="inline-flex items-center gap-3">
      <Bolt standing={standing} size={size} label="" drawn={drawn} />
      <span>{standingLabel(standing)}</span>
    </span>
  );
}
