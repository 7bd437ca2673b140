import type { Db } from "@/db/client";
import { findTrainee } from "@/db/queries/agreements";
import { listLicencesHeld } from "@/db/queries/licences";
import { listMarks, type Sheet } from "@/db/queries/observations";
import { listStandingObservations } from "@/db/queries/sign-offs";
import { ageOn } from "@/lib/core/dates";
import { levelCap, type LevelCap } from "@/lib/core/tasks/level-cap";
import { observationOutcome, type ObservationOutcome } from "@/lib/core/tasks/observation-outcome";
import type { CriterionMark } from "@/lib/core/tasks/types";
import { today } from "@/lib/services/clock";

export type ComputedSheet = { marks: CriterionMark[]; outcome: ObservationOutcome; cap: LevelCap };

/** What the sheet comes to as it stands now: the outcome with its reasons, and the highest level that the rules allow. */
export async function computeSheet(db: Db, sheet: Sheet): Promise<ComputedSheet> {
  const day = today();
  const marks = await listMarks(db, sheet);
  const outcome = observationOutcome(sheet.content, marks, sheet.stoppedReason);
  const past = await listStandingObservations(db, sheet);
  const trainee = await findTrainee(db, sheet.organisationId, sheet.apprenticeId);
  const cap = levelCap({
    rule: sheet.content.rule,
    prompted: marks.some((mark) => mark.prompts > 0 && mark.mark === "met"),
    metObservations: [
      ...past.filter((observation) => observation.outcome === "met"),
      { vehicle: sheet.vehicle, assessorId: sheet.assessorId },
    ],
    licences: await listLicencesHeld(db, sheet.apprenticeId, day),
    ageYears: trainee?.dateOfBirth ? ageOn(trainee.dateOfBirth, day) : null,
  });
  return { marks, outcome, cap };
}
