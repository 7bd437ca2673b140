import { getDb } from "@/db/client";
import { findSheetForUpdate, listMarks, upsertMark, type Sheet } from "@/db/queries/observations";
import { listInstruments } from "@/db/queries/instruments";
import { assertAllowed } from "@/lib/core/decision";
import { AppError } from "@/lib/core/errors";
import type { Actor } from "@/lib/core/roles";
import { judgeReading, type JudgedReading } from "@/lib/core/tasks/judge-reading";
import type { CriterionMark, Mark } from "@/lib/core/tasks/types";
import { canFillSheet } from "@/lib/policies/observations";
import type { MarkCriterionInput } from "@/lib/schemas/observations";

export type MarkedCriterion = { mark: Mark | null; judged: JudgedReading | null; filled: number };

/**
 * Puts down one criterion of an open sheet. The program judges a reading; a *set* reading outside its limits can't be met.
 * @returns the mark as it stands, what the program says of the reading, and how many criteria are filled
 * @throws AppError("forbidden" | "not_found" | "conflict" when signed or when the mark contradicts the reading)
 */
export async function markCriterion(
  actor: Actor,
  at: { observationId: string; criterionKey: string },
  input: MarkCriterionInput,
): Promise<MarkedCriterion> {
  return getDb().transaction(async (trx) => {
    const sheet = openSheet(await findSheetForUpdate(trx, actor.organisation.id, at.observationId), actor);
    const criterion = sheet.content.criteria.find((candidate) => candidate.key === at.criterionKey);
    if (!criterion) throw new AppError("not_found", "The task has no such criterion.");
    if (input.reading && !criterion.reading) throw new AppError("invalid_input", "This criterion takes no reading.");

    const instrumentInDate = await inDate(trx, sheet, input.reading?.instrumentId ?? null);
    const mark: CriterionMark = {
      key: criterion.key,
      mark: input.mark,
      reading: input.reading ? { ...input.reading, instrumentInDate } : null,
      prompts: input.prompts,
      remark: input.remark,
    };
    const judged = criterion.reading && mark.reading ? judgeReading(criterion.reading, mark.reading) : null;
    if (mark.mark === "met" && judged && !judged.canBeMet) throw new AppError("conflict", judged.sentence);

    await upsertMark(trx, sheet, mark);
    const marks = await listMarks(trx, sheet);
    return { mark: mark.mark, judged, filled: marks.filter((entry) => entry.mark !== null).length };
  });
}

/**
 * The sheet, if it is this assessor's and still open.
 * @throws AppError("not_found" | "forbidden" | "conflict")
 */
export function openSheet(sheet: Sheet | undefined, actor: Actor): Sheet {
  if (!sheet) throw new AppError("not_found", "There is no such observation sheet.");
  assertAllowed(canFillSheet(actor, sheet));
  if (sheet.state !== "open") throw new AppError("conflict", "This sheet was signed already. What was signed stays as it is.");
  return sheet;
}

async function inDate(trx: Parameters<typeof listInstruments>[0], sheet: Sheet, instrumentId: string | null): Promise<boolean | null> {
  if (!instrumentId) return null;
  const instrument = (await listInstruments(trx, sheet.workshopId)).find((candidate) => candidate.id === instrumentId);
  if (!instrument) throw new AppError("invalid_input", "That instrument is not on the workshop's list.");
  return instrument.calibrationDueOn >= sheet.startedAt.toISOString().slice(0, 10);
}
