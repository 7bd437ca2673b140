"use client";

import { leaveFor } from "@/components/accounts/leave-for";
import { Refused } from "@/components/accounts/refused";
import { useForm } from "@/components/accounts/use-form";
import { api } from "@/components/api/client";
import { Button } from "@/components/ui/button";

/** One press by somebody who is signed in with the invited address. */
export function AcceptSignedIn({ token }: { token: string }) {
  const { busy, refusal, formProps } = useForm(async () => {
    const { org } = await api("POST /invitations/accept", { params: {}, body: { token } });
    leaveFor(`/o/${org}/today`);
  });
  return (
    <form {...formProps} className="grid gap-4">
      <Refused refusal={refusal} />
      <Button type="submit" kind="main" disabled={busy} className="justify-self-start">
        {busy ? "Joining" : "Accept and join"}
      </Button>
    </form>
  );
}
