import type { PlateColumn, PlateLine } from "@/components/plate/plate-row";
import { Tag } from "@/components/ui/tag";
import type { Standing } from "@/lib/core/standing/types";

type Task = { id: string; title: string; shortTitle: string };
type Row = { personId: string; name: string; workshop: string; standings: Standing[]; waitedDays: number | null; waitsOn: string | null };

export const plateColumns = (tasks: Task[]): PlateColumn[] => tasks.map((task) => ({ id: task.id, label: task.shortTitle, title: task.title }));

/** Rows of a plate with what waits at their end. */
export const plateLines = (rows: Row[]): PlateLine[] =>
  rows.map((row) => ({
    id: row.personId,
    name: row.name,
    sub: row.workshop,
    href: null,
    standings: row.standings,
    tail: row.waitedDays === null ? <span className="text-ink2">nothing</span> : <Tag>{`${row.waitedDays} days`}</Tag>,
  }));
