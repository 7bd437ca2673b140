import { getDb } from "@/db/client";
import { listSignOffs, type SignOffListItem } from "@/db/reads/sign-offs";
import { AppError } from "@/lib/core/errors";
import type { Actor } from "@/lib/core/roles";

export type { SignOffListItem };

const NEWEST = 500;

/** The newest sign-offs that the organisation may read. @throws AppError("forbidden") */
export async function viewSignOffs(actor: Actor): Promise<SignOffListItem[]> {
  const staff = (["assessor", "liaison", "manager", "verifier"] as const).some((role) => actor.roles.has(role));
  if (!staff) throw new AppError("forbidden", "Your own sign-offs are in your record.");
  return listSignOffs(getDb(), actor.organisation.id, NEWEST);
}
