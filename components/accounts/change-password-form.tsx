"use client";

import { useRouter } from "next/navigation";
import { useRef, useState } from "react";
import { PasswordField } from "@/components/accounts/password-field";
import { textOf } from "@/components/accounts/refusal";
import { Refused } from "@/components/accounts/refused";
import { useForm } from "@/components/accounts/use-form";
import { api } from "@/components/api/client";
import { Button } from "@/components/ui/button";
import { Notice } from "@/components/ui/notice";

/** The old password, then a new one. Other devices are signed out. */
export function ChangePasswordForm({ email }: { email: string }) {
  const router = useRouter();
  const ref = useRef<HTMLFormElement>(null);
  const [ended, setEnded] = useState<number | null>(null);
  const { busy, refusal, formProps } = useForm(async (form) => {
    setEnded(null);
    const body = { current: textOf(form, "current"), next: textOf(form, "next") };
    const { otherSessionsEnded } = await api("PUT /account/password", { params: {}, body });
    setEnded(otherSessionsEnded);
    ref.current?.reset();
    router.refresh();
    return "again";
  });
  return (
    <form ref={ref} {...formProps} className="grid max-w-md gap-4">
      {ended !== null && (
        <Notice kind="done" title="Your password is changed">
          {ended === 0 ? "You were signed in nowhere else." : `Signed out on ${ended === 1 ? "one other device" : `${ended} other devices`}.`}
        </Notice>
      )}
      <Refused refusal={refusal} />
      <input type="hidden" name="email" autoComplete="username" value={email} readOnly />
      <PasswordField name="current" label="Old password" kind="old" error={refusal?.fields.current} />
      <PasswordField name="next" label="New password" kind="new" hint="At least 15 characters." error={refusal?.fields.next} />
      <Button type="submit" disabled={busy} className="justify-self-start">
        {busy ? "Changing it" : "Change the password"}
      </Button>
    </form>
  );
}
