import type { Db } from "@/db/client";

export type ReadyRow = {
  readinessId: string;
  apprenticeId: string;
  apprentice: string;
  workshopId: string;
  workshop: string;
  taskId: string;
  declaredAt: Date;
  bookedFor: Date | null;
  bookedBy: string | null;
};

/** Everybody whose record the organisation shares and who said "ready", longest waiting on top. One query. */
export async function listReady(db: Db, organisationId: string): Promise<ReadyRow[]> {
  const rows = await db("readiness as r")
    .join("people as p", "p.id", "r.apprentice_id")
    .join("training_agreements as a", "a.apprentice_id", "r.apprentice_id")
    .join("organisations as w", "w.id", "a.workshop_id")
    .leftJoin("people as b", "b.id", "r.booked_by")
    .select("r.id", "r.apprentice_id", "p.name", "a.workshop_id", "w.name as workshop", "r.task_id", "r.declared_at", "r.booked_for", "b.name as booked_by")
    .whereNull("r.ended_at")
    .whereRaw("daterange(a.starts_on, a.ends_on, '[]') @> current_date")
    .where((side) => side.where("a.workshop_id", organisationId).orWhere("a.college_id", organisationId))
    .orderBy("r.declared_at");
  return rows.map((row) => ({
    readinessId: row.id,
    apprenticeId: row.apprentice_id,
    apprentice: row.name,
    workshopId: row.workshop_id,
    workshop: row.workshop,
    taskId: row.task_id,
    declaredAt: row.declared_at,
    bookedFor: row.booked_for,
    bookedBy: row.booked_by,
  }));
}
