import type { Knex } from "knex";
import { putFile } from "@/db/queries/files";
import { putRendition, setSourceFacts, type RecordingSource } from "@/db/queries/recording-stages";
import type { Stage } from "@/db/queries/recordings";
import type { RenditionKind } from "@/db/queries/renditions";
import { renditionSize, type Size } from "@/lib/core/recordings/rendition-size";
import { writeStoryboardTrack } from "@/lib/core/recordings/storyboard";
import { env } from "@/lib/env";
import { makePoster, makeStoryboard } from "@/lib/jobs/media/pictures";
import { probeFilm } from "@/lib/jobs/media/probe";
import { transcode, type ShorterSide, type Work } from "@/lib/jobs/media/transcode";
import type { Workspace } from "@/lib/jobs/media/workspace";
import { renditionKey, RENDITIONS, type Rendition } from "@/storage/keys";
import { getStore } from "@/storage/store";

export type StageWork = Work & { recordingId: string; source: RecordingSource; workspace: Workspace };

/** Writes the rows that stand for what a stage made, in the transaction that calls it done. */
export type WriteRows = (trx: Knex.Transaction) => Promise<void>;

/** What each stage does. Each can be done again: the same objects are written under the same keys. */
export const STAGE_WORK: Record<Stage, (work: StageWork) => Promise<WriteRows>> = {
  probe: async ({ recordingId, source, workspace, signal }) => {
    const { durationMs, width, height, audioIndex } = await probeFilm(await workspace.fetch(source.storeKey), env().RECORDING_LIMIT_MS, signal);
    return (trx) => setSourceFacts(trx, recordingId, { durationMs, width, height, hasSound: audioIndex !== null });
  },
  "480p": (work) => makeFilm(work, "480p", 480),
  "720p": (work) => makeFilm(work, "720p", 720),
  poster: async (work) => {
    const path = work.workspace.path("poster.jpg");
    const size = renditionSize(measuredSize(work), 720);
    await makePoster(await madeFilm(work, "720p"), measuredMs(work), path, work);
    return keepFile(work, "poster", "poster", path, size);
  },
  storyboard: async (work) => {
    const path = work.workspace.path("storyboard.jpg");
    const durationMs = measuredMs(work);
    const plan = await makeStoryboard(await madeFilm(work, "480p"), durationMs, measuredSize(work), path, work);
    const sheet = { width: plan.columns * plan.tile.width, height: plan.rows * plan.tile.height };
    const writeSheet = await keepFile(work, "storyboard_sheet", "storyboard", path, sheet);
    const track = writeStoryboardTrack(plan, durationMs, RENDITIONS.storyboard.file);
    const trackKey = renditionKey(idsOf(work), "storyboardTrack");
    await getStore().putObject(trackKey, track, { contentType: RENDITIONS.storyboardTrack.contentType });
    return async (trx) => {
      await writeSheet(trx);
      await writeRendition(trx, work, "storyboard_track", "storyboardTrack", Buffer.byteLength(track), null);
    };
  },
};

const idsOf = ({ source, recordingId }: StageWork) => ({ organisationId: source.organisationId, recordingId });

const measuredMs = ({ source }: StageWork): number => {
  if (source.durationMs === null) throw new Error("A stage after probing found no length.");
  return source.durationMs;
};
const measuredSize = ({ source }: StageWork): Size => {
  if (source.width === null || source.height === null) throw new Error("A stage after probing found no size.");
  return { width: source.width, height: source.height };
};

/** The film made by an earlier stage: still on this disk, or fetched. */
const madeFilm = (work: StageWork, film: "480p" | "720p") => work.workspace.fetch(renditionKey(idsOf(work), film));

async function makeFilm(work: StageWork, film: "480p" | "720p", side: ShorterSide): Promise<WriteRows> {
  const source = await work.workspace.fetch(work.source.storeKey);
  const facts = await probeFilm(source, env().RECORDING_LIMIT_MS, work.signal);
  const path = work.workspace.path(RENDITIONS[film].file);
  const size = await transcode(source, facts, side, path, work);
  const write = await keepFile(work, film, film, path, size);
  work.workspace.keep(renditionKey(idsOf(work), film), path);
  return write;
}

async function keepFile(work: StageWork, kind: RenditionKind, rendition: Rendition, path: string, size: Size): Promise<WriteRows> {
  work.signal.throwIfAborted();
  const key = renditionKey(idsOf(work), rendition);
  const { sizeBytes } = await getStore().uploadFromFile(key, path, { contentType: RENDITIONS[rendition].contentType });
  return (trx) => writeRendition(trx, work, kind, rendition, sizeBytes, size);
}

async function writeRendition(
  trx: Knex.Transaction,
  work: StageWork,
  kind: RenditionKind,
  rendition: Rendition,
  sizeBytes: number,
  size: Size | null,
): Promise<void> {
  const { organisationId } = work.source;
  const storeKey = renditionKey(idsOf(work), rendition);
  const fileId = await putFile(trx, { organisationId, storeKey, mediaType: RENDITIONS[rendition].contentType, sizeBytes, createdBy: null });
  await putRendition(trx, { organisationId, recordingId: work.recordingId, kind, fileId, width: size?.width ?? null, height: size?.height ?? null });
}
