import type { RecordingCore } from "@/db/queries/recordings";
import { assertAllowed } from "@/lib/core/decision";
import { AppError } from "@/lib/core/errors";
import type { Actor } from "@/lib/core/roles";
import { canWorkOnRecordings } from "@/lib/policies/recordings";

/** Holds that the actor may work on recordings and that this one is there. @throws AppError("forbidden" | "not_found") */
export function workOn<Found>(actor: Actor, recording: Found | undefined): Found {
  assertAllowed(canWorkOnRecordings(actor));
  if (!recording) throw new AppError("not_found", "There is no such recording.");
  return recording;
}

/** The length of a recording that was measured. @throws AppError("conflict") while it wasn't */
export function measured(recording: RecordingCore): number {
  if (recording.durationMs === null) throw new AppError("conflict", "The film has not been measured yet. Try again when it is prepared.");
  return recording.durationMs;
}
