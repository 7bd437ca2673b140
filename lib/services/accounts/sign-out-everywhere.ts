import { getDb } from "@/db/client";
import { endSessionsOf } from "@/db/queries/sessions";
import type { SignedIn } from "@/lib/core/roles";

/** Ends every session of the person, the one in hand too; each device finds out at its next request. */
export async function signOutEverywhere(signedIn: SignedIn): Promise<{ ended: number }> {
  return { ended: await endSessionsOf(getDb(), signedIn.personId) };
}
