import type { Knex } from "knex";

/** Takes back what an apprentice holds of older revisions of this module. Their answers stay. */
export async function withdrawOlderAssignments(trx: Knex.Transaction, of: { moduleId: string; keepRevisionId: string; apprenticeIds: string[] }): Promise<void> {
  await trx("assignments")
    .where({ module_id: of.moduleId })
    .whereNot({ module_revision_id: of.keepRevisionId })
    .whereIn("apprentice_id", of.apprenticeIds)
    .whereNull("withdrawn_at")
    .update({ withdrawn_at: trx.fn.now() });
}

/** Gives a revision to apprentices. Who holds it already keeps it, with the new date. Returns the ids of those who newly got it. */
export async function giveRevision(
  trx: Knex.Transaction,
  of: { organisationId: string; moduleId: string; revisionId: string; assignedBy: string; dueOn: string },
  apprenticeIds: string[],
): Promise<string[]> {
  const { rows } = await trx.raw(
    `INSERT INTO assignments AS a (organisation_id, module_id, module_revision_id, apprentice_id, assigned_by, due_on)
     SELECT :organisationId, :moduleId, :revisionId, apprentice, :assignedBy, :dueOn FROM unnest(:apprenticeIds::uuid[]) AS apprentice
     ON CONFLICT (module_revision_id, apprentice_id) WHERE withdrawn_at IS NULL
     DO UPDATE SET due_on = excluded.due_on
     RETURNING apprentice_id, (xmax = 0) AS is_new`,
    { ...of, apprenticeIds },
  );
  return rows.filter((row: { is_new: boolean }) => row.is_new).map((row: { apprentice_id: string }) => row.apprentice_id);
}
