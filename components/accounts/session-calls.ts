import { leaveFor } from "@/components/accounts/leave-for";
import { ApiProblem } from "@/components/api/client";

/**
 * Signing in and out. The sign-in library's own client would ship a provider, a poller and three formats of answer for what is two
 * small requests: fetch the token that its forms carry, post the form.
 */
async function postAuth(path: "callback/credentials" | "signout", fields: Record<string, string>): Promise<URL> {
  try {
    const { csrfToken } = (await (await fetch("/api/auth/csrf", { cache: "no-store" })).json()) as { csrfToken: string };
    const response = await fetch(`/api/auth/${path}`, {
      method: "POST",
      body: new URLSearchParams({ ...fields, csrfToken, json: "true", callbackUrl: window.location.origin }),
    });
    const { url } = (await response.json()) as { url: string };
    return new URL(url, window.location.origin);
  } catch {
    throw new ApiProblem(0, "offline", "The connection is down. Try again when it is back.", []);
  }
}

/** @throws ApiProblem with a sentence to show when the sign-in is refused or the server can't be reached. */
export async function signIn(email: string, password: string): Promise<void> {
  const refused = (await postAuth("callback/credentials", { email, password })).searchParams.get("error");
  if (!refused) return;
  if (refused === "too_many") {
    throw new ApiProblem(429, "too_many", "Too many tries for this address. Wait a quarter of an hour, or set a new password.", []);
  }
  if (refused === "CredentialsSignin") {
    throw new ApiProblem(401, "unauthenticated", "That address and password don’t go together. Check both, or set a new password.", []);
  }
  throw new ApiProblem(500, "unexpected", "Signing in failed on our side. Try again in a minute.", []);
}

/** Ends this session on the server, then leaves to the front page with nothing of it kept in the window. */
export async function signOut(): Promise<void> {
  await postAuth("signout", {});
  leaveFor("/sign-in");
}
