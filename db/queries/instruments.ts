import type { Db } from "@/db/client";

export type Instrument = { id: string; label: string; kind: string; unit: string; calibrationDueOn: string };

/** Instruments at hand at a workshop, those out of date too: the sheet must be able to say so. */
export async function listInstruments(db: Db, organisationId: string): Promise<Instrument[]> {
  const rows = await db("instruments")
    .select("id", "label", "kind", "unit", "calibration_due_on")
    .where({ organisation_id: organisationId })
    .whereNull("retired_at")
    .orderBy("label");
  return rows.map((row) => ({ id: row.id, label: row.label, kind: row.kind, unit: row.unit, calibrationDueOn: row.calibration_due_on }));
}
