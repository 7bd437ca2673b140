import { getDb } from "@/db/client";
import { listTrainees } from "@/db/queries/agreements";
import { giveRevision, withdrawOlderAssignments } from "@/db/queries/assignments";
import { findModule, findNewestRevision } from "@/db/queries/modules";
import { formatDay } from "@/lib/core/dates";
import { assertAllowed } from "@/lib/core/decision";
import { AppError } from "@/lib/core/errors";
import { moduleGivenLetter } from "@/lib/core/letters/module-given";
import type { Actor } from "@/lib/core/roles";
import { env } from "@/lib/env";
import { postLetter } from "@/lib/jobs/post-letter";
import { canGiveModuleTo } from "@/lib/policies/modules";
import type { GiveModuleInput } from "@/lib/schemas/modules";
import { today } from "@/lib/services/clock";

/**
 * Gives the newest revision to apprentices who train here, by a date, and writes to each who didn't have it.
 * @returns how many newly got it
 * @throws AppError("forbidden" | "not_found" | "conflict" when nothing is published | "invalid_input" for a day that has passed)
 */
export async function giveModule(actor: Actor, moduleId: string, input: GiveModuleInput): Promise<{ given: number }> {
  if (input.dueOn < today()) throw new AppError("invalid_input", "That day has passed. Choose today or later.");
  const organisation = actor.organisation;
  return getDb().transaction(async (trx) => {
    const module = await findModule(trx, organisation.id, moduleId);
    if (!module) throw new AppError("not_found", "There is no such module.");
    const revision = await findNewestRevision(trx, organisation.id, moduleId);
    if (!revision) throw new AppError("conflict", "Publish the module first: apprentices learn from a frozen revision.");

    const trainees = new Map((await listTrainees(trx, organisation.id)).map((trainee) => [trainee.personId, trainee]));
    const chosen = input.apprenticeIds.map((id) => trainees.get(id));
    for (const trainee of chosen) {
      assertAllowed(canGiveModuleTo(actor, { trainsHereToday: trainee !== undefined, name: trainee?.name ?? "One of those people" }));
    }
    await withdrawOlderAssignments(trx, { moduleId, keepRevisionId: revision.id, apprenticeIds: input.apprenticeIds });
    const newIds = await giveRevision(
      trx,
      { organisationId: organisation.id, moduleId, revisionId: revision.id, assignedBy: actor.personId, dueOn: input.dueOn },
      input.apprenticeIds,
    );
    for (const id of newIds) {
      const trainee = trainees.get(id);
      if (!trainee) continue;
      await postLetter(
        trx,
        moduleGivenLetter({
          to: trainee.email,
          name: trainee.name,
          moduleTitle: revision.content.title,
          number: revision.number,
          givenBy: actor.name,
          workshop: organisation.name,
          dueOn: formatDay(input.dueOn),
          address: `${env().APP_URL}/o/${organisation.slug}/learn`,
        }),
      );
    }
    return { given: newIds.length };
  });
}
