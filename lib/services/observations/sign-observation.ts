import type { Knex } from "knex";
import { getDb } from "@/db/client";
import { findTrainee } from "@/db/queries/agreements";
import { endReadiness, findSheetForUpdate, setSigned, type Sheet } from "@/db/queries/observations";
import { insertSignOff } from "@/db/queries/sign-offs";
import { findReader, listMentorsConcerned } from "@/db/reads/sign-off-readers";
import { addMonths } from "@/lib/core/dates";
import { assertAllowed } from "@/lib/core/decision";
import { AppError } from "@/lib/core/errors";
import { signOffEntry } from "@/lib/core/ledger/sign-off-entry";
import { signedOffLetter, signedOffMentorLetter } from "@/lib/core/letters/signed-off";
import type { Actor } from "@/lib/core/roles";
import { LEVEL_LABEL, type Level, type Outcome } from "@/lib/core/tasks/types";
import { env } from "@/lib/env";
import { postLetter } from "@/lib/jobs/post-letter";
import { canObserve } from "@/lib/policies/observations";
import type { SignObservationInput } from "@/lib/schemas/observations";
import { confirmPassword } from "@/lib/services/accounts/confirm-password";
import { today } from "@/lib/services/clock";
import { appendEntry } from "@/lib/services/ledger/append-entry";
import { openSheet } from "@/lib/services/observations/mark-criterion";
import { computeSheet, type ComputedSheet } from "@/lib/services/observations/sheet-outcome";

export type Signed = { signOffId: string; outcome: Outcome; level: Level | null };

/**
 * Signs a finished sheet: the sign-off, its ledger entry, the end of "ready" and the letters, all or none.
 * The outcome is computed here, whatever the browser showed; the assessor sets the level, at most what the rules allow.
 * @throws AppError("forbidden" | "not_found" | "conflict" when signed already or not filled | "invalid_input" for the level | "too_many")
 */
export async function signObservation(actor: Actor, observationId: string, input: SignObservationInput): Promise<Signed> {
  await confirmPassword(getDb(), actor.personId, input.password);
  return getDb().transaction(async (trx) => {
    const sheet = openSheet(await findSheetForUpdate(trx, actor.organisation.id, observationId), actor);
    await assertStillMayObserve(trx, actor, sheet);
    const computed = await computeSheet(trx, sheet);
    const level = decidedLevel(computed, input.level as Level | null);

    const leafIndex = await appendEntry(trx, sheet.organisationId, entryOf(actor, sheet, computed, level, input.feedback));
    const signOffId = await insertSignOff(trx, {
      organisationId: sheet.organisationId,
      observationId: sheet.id,
      apprenticeId: sheet.apprenticeId,
      workshopId: sheet.workshopId,
      assessorId: sheet.assessorId,
      taskId: sheet.taskId,
      taskRevisionId: sheet.taskRevisionId,
      outcome: computed.outcome.outcome,
      level,
      feedback: input.feedback,
      reasons: { outcome: computed.outcome.reasons, cap: computed.cap },
      currentUntil: level === null ? null : addMonths(today(), sheet.content.rule.currencyMonths),
      leafIndex,
    });
    await setSigned(trx, sheet.id);
    await endReadiness(trx, sheet);
    await writeLetters(trx, actor, sheet, computed, { signOffId, level, feedback: input.feedback });
    return { signOffId, outcome: computed.outcome.outcome, level };
  });
}

/** The agreement may have ended since the sheet was opened. */
async function assertStillMayObserve(trx: Knex.Transaction, actor: Actor, sheet: Sheet): Promise<void> {
  const trainee = await findTrainee(trx, sheet.organisationId, sheet.apprenticeId);
  const { independence } = sheet.content.rule;
  assertAllowed(canObserve(actor, { ...sheet, sharesRecord: trainee !== undefined, independence }));
}

/** The level to write: none for "not yet", else the assessor's, within the cap. */
function decidedLevel({ outcome, cap }: ComputedSheet, level: Level | null): Level | null {
  if (outcome.missing.length > 0) throw new AppError("conflict", `Not filled in yet: ${outcome.missing.join(", ")}.`);
  if (outcome.outcome === "not_yet") {
    if (level !== null) throw new AppError("invalid_input", "The outcome is not yet, so there is no level to give.");
    return null;
  }
  if (level === null) throw new AppError("invalid_input", "Choose the supervision level.");
  if (level > cap.level) throw new AppError("invalid_input", `Level ${cap.level} at most: ${cap.reasons.join(" ")}`);
  return level;
}

function entryOf(actor: Actor, sheet: Sheet, computed: ComputedSheet, level: Level | null, feedback: string) {
  return signOffEntry({
    observationId: sheet.id,
    taskId: sheet.taskId,
    taskRevision: sheet.revisionNumber,
    taskContentHash: sheet.contentHash,
    outcome: computed.outcome.outcome,
    level,
    stoppedForSafety: sheet.stoppedReason !== null,
    marks: computed.marks,
    startedAt: sheet.startedAt.toISOString(),
    apprentice: { personId: sheet.apprenticeId, name: sheet.apprenticeName },
    assessor: { personId: actor.personId, name: actor.name },
    vehicle: sheet.vehicle,
    jobCardNumber: sheet.jobCardNumber,
    feedback,
  });
}

async function writeLetters(
  trx: Knex.Transaction,
  actor: Actor,
  sheet: Sheet,
  computed: ComputedSheet,
  of: { signOffId: string; level: Level | null; feedback: string },
): Promise<void> {
  const apprentice = await findReader(trx, sheet.apprenticeId);
  const mentors = await listMentorsConcerned(trx, sheet);
  const said = {
    apprentice: sheet.apprenticeName,
    task: sheet.content.title,
    outcome: computed.outcome.outcome,
    levelText: of.level === null ? "" : `${of.level}, ${LEVEL_LABEL[of.level]}`,
    reasons: computed.outcome.reasons.map((reason) => reason.text),
    feedback: of.feedback,
    assessor: actor.name,
    address: `${env().APP_URL}/o/${sheet.workshopSlug}/sign-offs/${of.signOffId}`,
  };
  if (apprentice) await postLetter(trx, signedOffLetter({ ...said, to: apprentice.email, name: apprentice.name }));
  for (const mentor of mentors) {
    await postLetter(trx, signedOffMentorLetter({ ...said, to: mentor.email, name: mentor.name }));
  }
}
