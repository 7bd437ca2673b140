import type { Knex } from "knex";
import { lockManagers } from "@/db/queries/memberships";
import { AppError } from "@/lib/core/errors";

/**
 * Holds every manager's membership until the transaction ends and refuses if nobody but `personId` is one: without a manager nobody
 * could invite anybody any more.
 * @throws AppError("conflict")
 */
export async function assertManagerRemains(trx: Knex.Transaction, organisationId: string, personId: string): Promise<void> {
  const managers = await lockManagers(trx, organisationId);
  if (managers.some((manager) => manager.personId !== personId)) return;
  throw new AppError("conflict", "This is the only manager. Make somebody else a manager first.");
}
