import type { Knex } from "knex";
import { getDb } from "@/db/client";
import { findRecordingForUpdate, findVehicle, putVehicle, setPrivateDetailsChecked, updateRecordingDetails } from "@/db/queries/recordings";
import { AppError } from "@/lib/core/errors";
import type { Actor } from "@/lib/core/roles";
import type { ChangeRecordingInput } from "@/lib/schemas/recordings";
import { workOn } from "@/lib/services/recordings/work-on";

/**
 * Changes a recording's details; what is left out stays.
 * @throws AppError("forbidden" | "not_found"; "invalid_input" for a vehicle that isn't this workshop's)
 */
export async function changeRecording(actor: Actor, recordingId: string, input: ChangeRecordingInput): Promise<{ changed: true }> {
  await getDb().transaction(async (trx) => {
    const { id, organisationId } = workOn(actor, await findRecordingForUpdate(trx, actor.organisation.id, recordingId));
    const vehicleId = await vehicleOf(trx, organisationId, input.vehicle);
    await updateRecordingDetails(trx, id, { title: input.title, vehicleId, consent: input.consent, consentNote: input.consentNote });
    if (input.privateDetailsChecked !== undefined) {
      await setPrivateDetailsChecked(trx, id, input.privateDetailsChecked ? actor.personId : null);
    }
  });
  return { changed: true };
}

async function vehicleOf(trx: Knex.Transaction, organisationId: string, vehicle: ChangeRecordingInput["vehicle"]): Promise<string | null | undefined> {
  if (!vehicle) return vehicle;
  if ("label" in vehicle) return putVehicle(trx, { organisationId, ...vehicle });
  const found = await findVehicle(trx, organisationId, vehicle.vehicleId);
  if (!found) throw new AppError("invalid_input", "That vehicle is not one of this workshop’s.", [{ path: "vehicle", message: "Choose another." }]);
  return found.id;
}
