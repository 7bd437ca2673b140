import { stringify } from "csv-stringify/sync";
import { RFC_4180 } from "@/lib/core/csv/rfc4180";
import { safeCell } from "@/lib/core/csv/safe-cell";
import type { Actor } from "@/lib/core/roles";
import { standingLabel } from "@/lib/core/standing/standing-label";
import type { Held } from "@/lib/core/standing/types";
import { viewCohort } from "@/lib/services/cohorts/view-cohort";

const HEADER = ["Apprentice", "Workshop", "Started", "Planned end", "Task", "Area", "Held level", "Current until", "Next", "Standing"];

const levelOf = (held: Held): string => (held.kind === "level" ? String(held.level) : "");
const untilOf = (held: Held): string => (held.kind === "level" ? held.until : "");

/**
 * A cohort's progress as CSV (RFC 4180, UTF-8, CRLF): one row for each apprentice and task. Cells can't turn into formulas.
 * @returns file name and text
 * @throws AppError("not_found" | "forbidden")
 */
export async function exportProgress(actor: Actor, cohortId: string): Promise<{ fileName: string; csv: string }> {
  const { name, plate } = await viewCohort(actor, cohortId);
  const rows = plate.rows.flatMap((row) =>
    plate.tasks.map((task, index) => {
      const standing = row.standings[index];
      if (!standing) throw new Error("The plate has a hole.");
      const cells = [row.name, row.workshop, row.startsOn, row.plannedEndOn, task.title, task.area, levelOf(standing.held), untilOf(standing.held), standing.next, standingLabel(standing)];
      return cells.map(safeCell);
    }),
  );
  return { fileName: `${name.toLowerCase().replace(/[^a-z0-9]+/g, "-")}-progress.csv`, csv: stringify([HEADER, ...rows], RFC_4180) };
}
