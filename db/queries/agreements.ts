import type { Db } from "@/db/client";

export type Trainee = {
  agreementId: string;
  personId: string;
  name: string;
  email: string;
  dateOfBirth: string | null;
  workshopId: string;
  workshopName: string;
  collegeId: string;
  collegeName: string;
  startsOn: string;
  plannedEndOn: string;
};

/** Apprentices whose record an organisation shares today, by name; the far side's name comes along. */
export async function listTrainees(db: Db, organisationId: string): Promise<Trainee[]> {
  return (await trainees(db, organisationId).orderBy("p.name")).map(toTrainee);
}

/** One apprentice whose record the organisation shares today; undefined for everybody else's. */
export async function findTrainee(db: Db, organisationId: string, personId: string): Promise<Trainee | undefined> {
  const row = await trainees(db, organisationId).where("a.apprentice_id", personId).first();
  return row && toTrainee(row);
}

const trainees = (db: Db, organisationId: string) =>
  db("training_agreements as a")
    .join("people as p", "p.id", "a.apprentice_id")
    .join("organisations as w", "w.id", "a.workshop_id")
    .join("organisations as c", "c.id", "a.college_id")
    .select(
      "a.id as agreement_id",
      "a.apprentice_id",
      "p.name",
      "p.email",
      "p.date_of_birth",
      "a.workshop_id",
      "w.name as workshop_name",
      "a.college_id",
      "c.name as college_name",
      "a.starts_on",
      "a.planned_end_on",
    )
    .where((side) => side.where("a.workshop_id", organisationId).orWhere("a.college_id", organisationId))
    .whereRaw("daterange(a.starts_on, a.ends_on, '[]') @> current_date");

type TraineeRow = {
  agreement_id: string;
  apprentice_id: string;
  name: string;
  email: string;
  date_of_birth: string | null;
  workshop_id: string;
  workshop_name: string;
  college_id: string;
  college_name: string;
  starts_on: string;
  planned_end_on: string;
};

const toTrainee = (row: TraineeRow): Trainee => ({
  agreementId: row.agreement_id,
  personId: row.apprentice_id,
  name: row.name,
  email: row.email,
  dateOfBirth: row.date_of_birth,
  workshopId: row.workshop_id,
  workshopName: row.workshop_name,
  collegeId: row.college_id,
  collegeName: row.college_name,
  startsOn: row.starts_on,
  plannedEndOn: row.planned_end_on,
});
