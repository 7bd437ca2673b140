"use client";

import { useState } from "react";
import { api } from "@/components/api/client";
import { usePress } from "@/components/api/use-press";
import { Button } from "@/components/ui/button";
import { TextArea, TextField } from "@/components/ui/field";
import { Notice } from "@/components/ui/notice";

/** Withdraws a sign-off by a further entry. It can't be undone, so it asks for reason and password. */
export function WithdrawForm({ params }: { params: { org: string; signOffId: string } }) {
  const [open, setOpen] = useState(false);
  const withdraw = usePress(
    (body: { password: string; reason: string }) => api("POST /orgs/{org}/sign-offs/{signOffId}/withdrawal", { params, body }),
    () => setOpen(false),
  );
  if (!open) return <Button onClick={() => setOpen(true)}>Withdraw this sign-off</Button>;
  return (
    <form
      className="grid max-w-lg gap-3"
      onSubmit={(event) => {
        event.preventDefault();
        const data = new FormData(event.currentTarget);
        withdraw.mutate({ password: String(data.get("password") ?? ""), reason: String(data.get("reason") ?? "") });
      }}
    >
      {withdraw.error && <Notice kind="error" title={withdraw.error.message} />}
      <TextArea label="Reason" name="reason" required maxLength={500} hint="It stands in the record. The sign-off itself stays readable." />
      <TextField label="Your password" name="password" type="password" autoComplete="current-password" required />
      <div className="flex gap-3">
        <Button kind="main" type="submit" disabled={withdraw.isPending}>
          Withdraw
        </Button>
        <Button onClick={() => setOpen(false)}>Keep it</Button>
      </div>
    </form>
  );
}
