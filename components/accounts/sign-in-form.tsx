"use client";

import Link from "next/link";
import { useRef } from "react";
import { DemoSignIns } from "@/components/accounts/demo-sign-ins";
import { leaveFor } from "@/components/accounts/leave-for";
import { PasswordField } from "@/components/accounts/password-field";
import { textOf } from "@/components/accounts/refusal";
import { Refused } from "@/components/accounts/refused";
import { signIn } from "@/components/accounts/session-calls";
import { useForm } from "@/components/accounts/use-form";
import { Button } from "@/components/ui/button";
import { TextField } from "@/components/ui/field";
import type { DemoSignIn } from "@/lib/schemas/accounts";

type SignInFormProps = { next: string; email?: string; demo?: readonly DemoSignIn[]; mailSinkUrl?: string | null };

/** Address and password. Leaves by a whole new page, so that nothing of an earlier sign-in stays in the window. */
export function SignInForm({ next, email = "", demo, mailSinkUrl }: SignInFormProps) {
  const ref = useRef<HTMLFormElement>(null);
  const { busy, refusal, formProps } = useForm(async (form) => {
    await signIn(textOf(form, "email"), textOf(form, "password"));
    leaveFor(next);
  });
  function fillIn(chosen: DemoSignIn) {
    for (const name of ["email", "password"] as const) {
      const field = ref.current?.elements.namedItem(name);
      if (field instanceof HTMLInputElement) field.value = chosen[name];
    }
    ref.current?.requestSubmit();
  }
  return (
    <>
      <form ref={ref} {...formProps} className="grid gap-4">
        <Refused refusal={refusal} />
        <TextField name="email" label="E-mail address" type="email" autoComplete="username" inputMode="email" defaultValue={email} required />
        <PasswordField name="password" label="Password" kind="old" />
        <div className="flex flex-wrap items-center justify-between gap-3">
          <Button type="submit" kind="main" disabled={busy} className="min-w-40">
            {busy ? "Signing in" : "Sign in"}
          </Button>
          <Link href="/forgotten" className="inline-flex min-h-11 items-center text-strong underline underline-offset-4">
            Set a new password
          </Link>
        </div>
      </form>
      {demo && <DemoSignIns signIns={demo} mailSinkUrl={mailSinkUrl ?? null} busy={busy} onChoose={fillIn} />}
    </>
  );
}
