import { pino } from "pino";
import { z } from "zod";
import { getDb } from "@/db/client";
import {
  claimNextStage, failStage, findSource, finishStage, listForsaken, lockRecording, markReadyIfDone, releaseStage, type ClaimedStage,
} from "@/db/queries/recording-stages";
import type { Stage } from "@/db/queries/recordings";
import { AppError } from "@/lib/core/errors";
import { enqueue } from "@/lib/jobs/enqueue";
import { holdLease } from "@/lib/jobs/media/hold-lease";
import { MediaFault } from "@/lib/jobs/media/media-fault";
import { STAGE_WORK } from "@/lib/jobs/media/stages";
import { openWorkspace, type Workspace } from "@/lib/jobs/media/workspace";

export const processRecordingPayload = z.object({ recordingId: z.uuid() });

const log = pino({ name: "process-recording" });

/** After so many workers died over it, a stage waits for a person. */
const MOST_ATTEMPTS = 4;

const DOING: Record<Stage, string> = {
  probe: "Looking at the film",
  "480p": "Making the 480p film",
  "720p": "Making the 720p film",
  poster: "Taking the poster",
  storyboard: "Making the storyboard",
};

/**
 * Prepares a recording, stage by stage, from the first that is not done. Safe to run twice and to be killed: whoever holds a stage gives
 * signs of life, and a stage without them is taken over. What can't be prepared is noted with its reason, for the mentor to try again.
 */
export async function processRecording(data: unknown): Promise<void> {
  const { recordingId } = processRecordingPayload.parse(data);
  let claim = await getDb().transaction((trx) => claimNextStage(trx, recordingId));
  if (!claim) return;
  const workspace = await openWorkspace(recordingId);
  try {
    while (claim) claim = await doStage(claim, workspace);
  } finally {
    await workspace.remove();
  }
}

/** Does one stage and takes the next in the same breath, so that at every moment the recording is held or there is nothing to do. */
async function doStage(claim: ClaimedStage, workspace: Workspace): Promise<ClaimedStage | undefined> {
  if (claim.attempt > MOST_ATTEMPTS) {
    await fail(claim, `${DOING[claim.stage]} was tried ${MOST_ATTEMPTS} times and broke off each time.`);
    return undefined;
  }
  const lease = holdLease(claim);
  try {
    const source = await findSource(getDb(), claim.recordingId);
    if (!source) throw new Error("The recording has no source.");
    const writeRows = await STAGE_WORK[claim.stage]({ recordingId: claim.recordingId, source, workspace, ...lease });
    await lease.stop();
    return await getDb().transaction(async (trx) => {
      await lockRecording(trx, claim.recordingId);
      if (!(await finishStage(trx, claim))) return undefined;
      await writeRows(trx);
      await markReadyIfDone(trx, claim.recordingId);
      return claimNextStage(trx, claim.recordingId);
    });
  } catch (error) {
    await lease.stop();
    if (lease.signal.aborted) return undefined;
    return await giveUp(claim, error);
  }
}

async function giveUp(claim: ClaimedStage, error: unknown): Promise<undefined> {
  if (error instanceof MediaFault) {
    log.info({ ...claim, said: error.log }, error.message);
    await fail(claim, error.message);
    return undefined;
  }
  // The store will be back: the stage goes back to waiting, and the queue or the sweep tries again.
  if (error instanceof AppError && error.code === "unavailable") await releaseStage(getDb(), claim);
  else await fail(claim, `${DOING[claim.stage]} broke off by a fault of the program or the store. The film is safe.`);
  throw error;
}

async function fail(claim: ClaimedStage, reason: string): Promise<void> {
  await getDb().transaction(async (trx) => {
    await lockRecording(trx, claim.recordingId);
    await failStage(trx, claim, reason);
  });
}

/** Puts recordings back in the queue that a killed worker left behind. Run at a worker's start and now and then; doing it often harms nothing. */
export async function takeUpForsaken(): Promise<string[]> {
  return getDb().transaction(async (trx) => {
    const recordingIds = await listForsaken(trx);
    for (const recordingId of recordingIds) await enqueue(trx, "process-recording", { recordingId });
    return recordingIds;
  });
}
