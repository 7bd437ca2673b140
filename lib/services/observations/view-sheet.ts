import { getDb } from "@/db/client";
import { listInstruments, type Instrument } from "@/db/queries/instruments";
import { findSheet, listMarks } from "@/db/queries/observations";
import { listEvidence } from "@/db/queries/practice";
import { assertAllowed } from "@/lib/core/decision";
import { AppError } from "@/lib/core/errors";
import type { Actor } from "@/lib/core/roles";
import { judgeReading, type JudgedReading } from "@/lib/core/tasks/judge-reading";
import type { CriterionMark, TaskContent } from "@/lib/core/tasks/types";
import { canFillSheet } from "@/lib/policies/observations";
import { getStore } from "@/storage/store";

export type SheetView = {
  observationId: string;
  apprentice: string;
  content: TaskContent;
  revisionNumber: number;
  vehicle: string;
  jobCardNumber: string;
  startedAt: string;
  stoppedReason: string | null;
  marks: (CriterionMark & { judged: JudgedReading | null })[];
  instruments: Instrument[];
  photos: { id: string; note: string; url: string }[];
};

/**
 * The open sheet as its assessor fills it in.
 * @throws AppError("not_found" | "forbidden"); a signed sheet is not_found here: it is a sign-off now
 */
export async function viewSheet(actor: Actor, observationId: string): Promise<SheetView> {
  const db = getDb();
  const sheet = await findSheet(db, actor.organisation.id, observationId);
  if (!sheet || sheet.state !== "open") throw new AppError("not_found", "There is no such open sheet.");
  assertAllowed(canFillSheet(actor, sheet));
  const marks = await listMarks(db, sheet);
  const specs = new Map(sheet.content.criteria.map((criterion) => [criterion.key, criterion.reading]));
  const photos = await listEvidence(db, sheet);
  return {
    observationId,
    apprentice: sheet.apprenticeName,
    content: sheet.content,
    revisionNumber: sheet.revisionNumber,
    vehicle: sheet.vehicle,
    jobCardNumber: sheet.jobCardNumber,
    startedAt: sheet.startedAt.toISOString(),
    stoppedReason: sheet.stoppedReason,
    marks: marks.map((mark) => {
      const spec = specs.get(mark.key);
      return { ...mark, judged: spec && mark.reading ? judgeReading(spec, mark.reading) : null };
    }),
    instruments: await listInstruments(db, sheet.workshopId),
    photos: await Promise.all(
      photos.map(async (photo) => ({ id: photo.id, note: photo.note, url: await getStore().presignGet(photo.storeKey, 6 * 3600, { responseContentType: photo.mediaType }) })),
    ),
  };
}
