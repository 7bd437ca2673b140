"use client";

import { useState } from "react";
import { textOf } from "@/components/accounts/refusal";
import { Refused } from "@/components/accounts/refused";
import { useForm } from "@/components/accounts/use-form";
import { api } from "@/components/api/client";
import { Button, LinkButton } from "@/components/ui/button";
import { TextField } from "@/components/ui/field";
import { Notice } from "@/components/ui/notice";

/** Asks for a letter with a link; says the same whether anybody has the address. */
export function ForgottenForm() {
  const [askedFor, setAskedFor] = useState<string | null>(null);
  const { busy, refusal, formProps } = useForm(async (form) => {
    const email = textOf(form, "email");
    await api("POST /password-resets", { params: {}, body: { email } });
    setAskedFor(email);
  });
  if (askedFor !== null) {
    return (
      <>
        <Notice kind="done" title="Look for a letter">
          If {askedFor} has an account here, a letter with a link is on its way. The link works once, for an hour. Nothing there after a few
          minutes: look among the unwanted mail, or ask your manager which address you were invited with.
        </Notice>
        <LinkButton href="/sign-in" className="justify-self-start">
          Back to sign in
        </LinkButton>
      </>
    );
  }
  return (
    <form {...formProps} className="grid gap-4">
      <Refused refusal={refusal} />
      <TextField name="email" label="E-mail address" type="email" autoComplete="username" error={refusal?.fields.email} required />
      <Button type="submit" kind="main" disabled={busy} className="justify-self-start">
        {busy ? "Asking" : "Send me the link"}
      </Button>
    </form>
  );
}
