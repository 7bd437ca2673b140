import { getDb } from "@/db/client";
import { endSessionOf } from "@/db/queries/sessions";
import { AppError } from "@/lib/core/errors";
import type { SignedIn } from "@/lib/core/roles";

/**
 * Ends one of the person's own sessions.
 * @throws AppError("not_found") for somebody else's, or one that has ended
 */
export async function signOutDevice(signedIn: SignedIn, sessionId: string): Promise<{ ended: 1 }> {
  if (!(await endSessionOf(getDb(), signedIn.personId, sessionId))) throw new AppError("not_found", "That device is signed out already.");
  return { ended: 1 };
}
