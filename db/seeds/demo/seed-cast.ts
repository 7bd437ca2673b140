import { orgId, personId } from "@/db/seeds/demo/ids";
import type { Knex } from "knex";
import { AGREEMENTS, APPRENTICES, INSTRUMENTS, LICENCES, ORGANISATIONS, STAFF, VEHICLES, type OrganisationKey } from "@/db/seeds/demo/cast";
import { demoId } from "@/db/seeds/demo/demo-id";

/** ISO day `offset` days after `day` (before it, when negative). */
export function dayFrom(day: string, offset: number): string {
  const date = new Date(`${day}T00:00:00Z`);
  date.setUTCDate(date.getUTCDate() + offset);
  return date.toISOString().slice(0, 10);
}


/** Organisations, people, memberships, agreements, the cohort, vehicles, instruments and licences. */
export async function seedCast(trx: Knex.Transaction, day: string, passwordHash: string): Promise<void> {
  await trx("organisations").insert(
    Object.entries(ORGANISATIONS).map(([key, organisation]) => ({ id: orgId(key as OrganisationKey), ...organisation, is_demo: true })),
  );
  const people = [...STAFF, ...APPRENTICES];
  await trx("people").insert(
    people.map((person) => ({
      id: personId(person.key),
      name: person.name,
      email: person.email,
      password_hash: passwordHash,
      date_of_birth: dayFrom(`${Number(day.slice(0, 4)) - person.ageYears}${day.slice(4) === "-02-29" ? "-02-28" : day.slice(4)}`, -person.ageDays),
    })),
  );
  await trx("memberships").insert(
    people.flatMap((person) =>
      Object.entries(person.at).map(([key, roles]) => ({
        organisation_id: orgId(key as OrganisationKey),
        person_id: personId(person.key),
        roles,
        joined_at: dayFrom(day, -1100),
      })),
    ),
  );
  await seedAgreements(trx, day);
  await seedWorkshops(trx, day);
}

async function seedAgreements(trx: Knex.Transaction, day: string): Promise<void> {
  const merrowdale = orgId("merrowdale");
  const rows = AGREEMENTS.map((agreement) => ({
    id: demoId(`agreement/${agreement.apprentice}/${agreement.workshop}`),
    apprentice_id: personId(agreement.apprentice),
    workshop_id: orgId(agreement.workshop),
    college_id: merrowdale,
    qualification: "Light vehicle technician, level 3 (invented)",
    starts_on: dayFrom(day, -agreement.startsDaysAgo),
    planned_end_on: dayFrom(day, agreement.plannedEndInDays),
    ends_on: agreement.endedDaysAgo === null ? null : dayFrom(day, -agreement.endedDaysAgo),
    contracted_minutes: 37.5 * 60 * 46 * 3,
  }));
  await trx("training_agreements").insert(rows);
  const cohort = demoId("cohort/lv-26");
  await trx("cohorts").insert({ id: cohort, organisation_id: merrowdale, name: "Merrowdale LV-26", starts_on: dayFrom(day, -1106) });
  await trx("cohort_members").insert(
    rows.filter((row) => row.ends_on === null).map((row) => ({ organisation_id: merrowdale, cohort_id: cohort, agreement_id: row.id })),
  );
}

async function seedWorkshops(trx: Knex.Transaction, day: string): Promise<void> {
  for (const workshop of ["vennick", "saltmarsh"] as const) {
    await trx("vehicles").insert(
      VEHICLES[workshop].map((vehicle) => ({ id: demoId(`vehicle/${vehicle.label}`), organisation_id: orgId(workshop), ...vehicle })),
    );
    await trx("instruments").insert(
      INSTRUMENTS.map((instrument) => ({
        id: demoId(`instrument/${workshop}/${instrument.label}`),
        organisation_id: orgId(workshop),
        label: instrument.label,
        kind: instrument.kind,
        unit: instrument.unit,
        range_low: instrument.low,
        range_high: instrument.high,
        calibrated_on: dayFrom(day, -instrument.calibratedDaysAgo),
        calibration_due_on: dayFrom(day, instrument.dueInDays),
      })),
    );
  }
  await trx("licences").insert(
    LICENCES.map((licence) => ({
      person_id: personId(licence.person),
      kind: licence.kind,
      number: licence.number,
      valid_from: dayFrom(day, -licence.fromDaysAgo),
      valid_until: dayFrom(day, licence.untilInDays),
    })),
  );
}
