"use client";

import { leaveFor } from "@/components/accounts/leave-for";
import { PasswordField } from "@/components/accounts/password-field";
import { textOf } from "@/components/accounts/refusal";
import { Refused } from "@/components/accounts/refused";
import { signIn } from "@/components/accounts/session-calls";
import { useForm } from "@/components/accounts/use-form";
import { api } from "@/components/api/client";
import { Button } from "@/components/ui/button";
import { TextField } from "@/components/ui/field";
import type { InvitationView } from "@/lib/schemas/accounts";

/** Name and password of somebody who is new here; an apprentice may also give their date of birth, since some work has an age. */
export function AcceptAsNew({ token, invitation }: { token: string; invitation: InvitationView }) {
  const { busy, refusal, formProps } = useForm(async (form) => {
    const password = textOf(form, "password");
    const person = { name: textOf(form, "name"), password, dateOfBirth: textOf(form, "dateOfBirth") || null };
    const { org, email } = await api("POST /invitations/accept", { params: {}, body: { token, person } });
    await signIn(email, password);
    leaveFor(`/o/${org}/today`);
  });
  return (
    <form {...formProps} className="grid gap-4">
      <Refused refusal={refusal} />
      <input type="hidden" name="email" autoComplete="username" value={invitation.email} readOnly />
      <TextField name="name" label="Your name" autoComplete="name" defaultValue={invitation.name} error={refusal?.fields.name} required />
      <PasswordField
        name="password"
        label="Choose a password"
        kind="new"
        hint="At least 15 characters. Four or five words that have nothing to do with each other are easy to keep."
        error={refusal?.fields.password}
      />
      {invitation.roles.includes("apprentice") && (
        <TextField
          name="dateOfBirth"
          label="Date of birth, if you are under 18"
          type="date"
          autoComplete="bday"
          hint="Some work needs closer eyes under a certain age. May be left open."
          error={refusal?.fields.dateOfBirth}
        />
      )}
      <Button type="submit" kind="main" disabled={busy} className="justify-self-start">
        {busy ? "Joining" : "Accept and join"}
      </Button>
    </form>
  );
}
