import type { PlannedStanding } from "@/db/seeds/demo/history";
import { CHANGED_TASK } from "@/db/seeds/demo/seed-work";
import { revisionHash } from "@/lib/core/modules/revision-hash";
import type { Standing } from "@/lib/core/standing/types";
import type { TaskContent } from "@/lib/core/tasks/types";

/** A standing as one line, for comparing what came out with what was planned. */
export function standingCode({ held, next }: Standing): string {
  const holds = held.kind === "nothing" ? "nothing" : `${held.kind} ${held.level}`;
  return `${holds}, ${next}`;
}

standingCode.planned = ({ held, next }: PlannedStanding, task: string): string => {
  if (!held) return `nothing, ${next}`;
  const kind = held.withdrawn ? "withdrawn" : held.ranOut || task === CHANGED_TASK ? "recheck_due" : "level";
  return `${kind} ${held.level}, ${next}`;
};

export const taskContentHashMatches = (row: { content: TaskContent; content_hash: string }): boolean => revisionHash(row.content) === row.content_hash;
