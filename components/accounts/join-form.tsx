"use client";

import { useEffect, useState } from "react";
import { AcceptAsNew } from "@/components/accounts/accept-as-new";
import { AcceptSignedIn } from "@/components/accounts/accept-signed-in";
import { useLinkToken } from "@/components/accounts/link-token";
import { refusalOf, type Refusal } from "@/components/accounts/refusal";
import { signOut } from "@/components/accounts/session-calls";
import { SignInForm } from "@/components/accounts/sign-in-form";
import { api } from "@/components/api/client";
import { Button, LinkButton } from "@/components/ui/button";
import { Notice } from "@/components/ui/notice";
import type { InvitationView } from "@/lib/schemas/accounts";

/** What an invitation's link leads to: who asks, to what, and the one thing that has to be done to accept. */
export function JoinForm() {
  const token = useLinkToken();
  const [invitation, setInvitation] = useState<InvitationView | null>(null);
  const [refusal, setRefusal] = useState<Refusal | null>(null);
  useEffect(() => {
    if (token === undefined) return;
    const asked = new AbortController();
    api("POST /invitations/look", { params: {}, body: { token }, signal: asked.signal })
      .then(setInvitation, (error: unknown) => !asked.signal.aborted && setRefusal(refusalOf(error)));
    return () => asked.abort();
  }, [token]);

  if (refusal) {
    return (
      <>
        <Notice kind="error" title={refusal.code === "gone" ? "This link does not work any more" : "The invitation could not be read"}>
          {refusal.sentence}
        </Notice>
        <LinkButton href="/sign-in" className="justify-self-start">
          Sign in
        </LinkButton>
      </>
    );
  }
  if (!invitation || !token) return <p className="text-ink2">Reading the invitation.</p>;
  return (
    <>
      <div>
        <p className="text-[1.15rem]">
          {invitation.invitedBy ? `${invitation.invitedBy} asks you to join` : "You are asked to join"} <b>{invitation.organisation}</b> as{" "}
          <b>{invitation.roleLabels.join(" and ")}</b>.
        </p>
        <p className="mt-1 text-ink2">For {invitation.email}.</p>
      </div>
      <NextAct token={token} invitation={invitation} />
    </>
  );
}

function NextAct({ token, invitation }: { token: string; invitation: InvitationView }) {
  switch (invitation.you) {
    case "new":
      return <AcceptAsNew token={token} invitation={invitation} />;
    case "ready":
      return <AcceptSignedIn token={token} />;
    case "sign_in":
      return (
        <>
          <Notice title="You have an account with this address already">Sign in with it; then one press accepts.</Notice>
          <SignInForm next={`/join#${token}`} email={invitation.email} />
        </>
      );
    case "someone_else":
      return (
        <>
          <Notice title={`You are signed in as ${invitation.signedInAs ?? "somebody else"}`}>
            The invitation is for another address. Sign out, then open the link in the letter again.
          </Notice>
          <Button className="justify-self-start" onClick={() => void signOut()}>
            Sign out
          </Button>
        </>
      );
  }
}
