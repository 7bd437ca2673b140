import "server-only";
import { getServerSession } from "next-auth";
import { cache } from "react";
import { getDb } from "@/db/client";
import { findActorRow, findSessionPerson } from "@/db/queries/people";
import { authOptions } from "@/lib/auth/options";
import type { Actor, SignedIn } from "@/lib/core/roles";

/** The person behind this request, or undefined. The cookie names a session; the database says whether it still holds. Once per request. */
export const findSignedIn = cache(async (): Promise<SignedIn | undefined> => {
  const session = await getServerSession(authOptions);
  if (!session?.sessionId) return undefined;
  return findSessionPerson(getDb(), session.sessionId);
});

/** The person with the roles they have now at the organisation in the address, or undefined where they are no member. */
export const findActor = cache(async (signedIn: SignedIn, slug: string): Promise<Actor | undefined> => {
  const row = await findActorRow(getDb(), signedIn.personId, slug);
  return row && { ...signedIn, ...row };
});
