import type { Db } from "@/db/client";
import type { Standing } from "@/lib/core/standing/types";
import { listStandings } from "@/lib/services/standing/list-standings";

/** One person's standing on one task. */
export async function standingOn(db: Db, apprenticeId: string, taskId: string): Promise<Standing> {
  return (await listStandings(db, [apprenticeId], [taskId])).of(apprenticeId, taskId).standing;
}
