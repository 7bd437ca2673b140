import "server-only";
import { notFound, redirect } from "next/navigation";
import { findActor, findSignedIn } from "@/lib/auth/actor";
import { AppError } from "@/lib/core/errors";
import type { Actor, SignedIn } from "@/lib/core/roles";

/** The signed-in person, or off to the sign-in page and back here afterwards. */
export async function requireSignedIn(returnTo: string): Promise<SignedIn> {
  const signedIn = await findSignedIn();
  if (!signedIn) redirect(`/sign-in?next=${encodeURIComponent(returnTo)}`);
  return signedIn;
}

/** The signed-in person as a member of `org`; a 404 where they are none. Every page under /o/[org] begins with this. */
export async function requireActor(org: string, path: string): Promise<Actor> {
  const signedIn = await requireSignedIn(`/o/${org}${path}`);
  const actor = await findActor(signedIn, org);
  if (!actor) notFound();
  return actor;
}

/** Runs a page's view service; what the person may not see, or isn't there, is a 404 either way. */
export async function view<T>(load: Promise<T>): Promise<T> {
  try {
    return await load;
  } catch (error) {
    if (error instanceof AppError && (error.code === "not_found" || error.code === "forbidden")) notFound();
    throw error;
  }
}

const UUID = /^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/;

/** An id in the address that can't be one is an address that isn't there. Returns it, so that it reads as a value. */
export function addressId(text: string): string {
  if (!UUID.test(text)) notFound();
  return text;
}
