"use client";

import { useState } from "react";
import { useLinkToken } from "@/components/accounts/link-token";
import { PasswordField } from "@/components/accounts/password-field";
import { textOf } from "@/components/accounts/refusal";
import { Refused } from "@/components/accounts/refused";
import { useForm } from "@/components/accounts/use-form";
import { api } from "@/components/api/client";
import { Button, LinkButton } from "@/components/ui/button";
import { Notice } from "@/components/ui/notice";

/** Sets a new password with the link of a letter. */
export function NewPasswordForm() {
  const token = useLinkToken();
  const [setFor, setSetFor] = useState<string | null>(null);
  const { busy, refusal, formProps } = useForm(async (form) => {
    const { email } = await api("POST /password-resets/use", {
      params: {},
      body: { token: token ?? "", password: textOf(form, "password") },
    });
    setSetFor(email);
  });
  if (setFor !== null) {
    return (
      <>
        <Notice kind="done" title="Your new password is set">
          You were signed out on every device. Sign in as {setFor}.
        </Notice>
        <LinkButton href="/sign-in" kind="main" className="justify-self-start">
          Sign in
        </LinkButton>
      </>
    );
  }
  if (token === "" || refusal?.code === "gone") {
    return (
      <>
        <Notice kind="error" title="This link does not work any more">
          {refusal?.sentence ?? "It is not complete. Open it from the letter, or ask for a new one."}
        </Notice>
        <LinkButton href="/forgotten" kind="main" className="justify-self-start">
          Ask for a new link
        </LinkButton>
      </>
    );
  }
  return (
    <form {...formProps} className="grid gap-4">
      <Refused refusal={refusal} />
      <PasswordField
        name="password"
        label="New password"
        kind="new"
        hint="At least 15 characters. Four or five words that have nothing to do with each other are easy to keep."
        error={refusal?.fields.password}
      />
      <Button type="submit" kind="main" disabled={busy} className="justify-self-start">
        {busy ? "Setting it" : "Set the password"}
      </Button>
    </form>
  );
}
