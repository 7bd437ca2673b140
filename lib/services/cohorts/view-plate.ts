import type { Db } from "@/db/client";
import { listUsableTaskRevisions } from "@/db/queries/tasks";
import { daysBetween } from "@/lib/core/dates";
import type { Standing } from "@/lib/core/standing/types";
import { today } from "@/lib/services/clock";
import { listStandings } from "@/lib/services/standing/list-standings";

export type PlateTask = { id: string; title: string; shortTitle: string; area: string };
export type PlateRow = {
  personId: string;
  name: string;
  workshop: string;
  startsOn: string;
  plannedEndOn: string;
  standings: Standing[];
  held: number;
  /** Days that the longest open "ready" has waited; null when nothing waits. */
  waitedDays: number | null;
  waitsOn: string | null;
};
export type Plate = { tasks: PlateTask[]; rows: PlateRow[] };

type Person = { personId: string; name: string; workshop: string; startsOn: string; plannedEndOn: string };

/** People × tasks, one standing each. The number of queries doesn't grow with either. */
export async function viewPlate(db: Db, organisationId: string, people: Person[]): Promise<Plate> {
  const revisions = (await listUsableTaskRevisions(db, organisationId)).toSorted(
    (a, b) => a.content.area.localeCompare(b.content.area) || a.content.shortTitle.localeCompare(b.content.shortTitle),
  );
  const tasks = revisions.map(({ taskId, content }) => ({ id: taskId, title: content.title, shortTitle: content.shortTitle, area: content.area }));
  const standings = await listStandings(db, people.map((person) => person.personId), tasks.map((task) => task.id));
  const day = today();
  const rows = people.map((person) => {
    const known = tasks.map((task) => standings.of(person.personId, task.id));
    const waiting = known
      .flatMap(({ progress }, index) => (progress.readySince ? [{ since: progress.readySince, task: tasks[index]?.title ?? "" }] : []))
      .toSorted((a, b) => a.since.getTime() - b.since.getTime())[0];
    return {
      ...person,
      standings: known.map(({ standing }) => standing),
      held: known.filter(({ standing }) => standing.held.kind === "level").length,
      waitedDays: waiting ? daysBetween(waiting.since.toISOString().slice(0, 10), day) : null,
      waitsOn: waiting?.task ?? null,
    };
  });
  return { tasks, rows };
}
