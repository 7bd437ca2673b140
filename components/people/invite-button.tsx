"use client";

import { useRouter } from "next/navigation";
import { useState } from "react";
import { textOf } from "@/components/accounts/refusal";
import { Refused } from "@/components/accounts/refused";
import { useForm } from "@/components/accounts/use-form";
import { api } from "@/components/api/client";
import { chosenRoles, RoleBoxes, type RoleChoice } from "@/components/people/role-boxes";
import { Button } from "@/components/ui/button";
import { Dialog } from "@/components/ui/dialog";
import { TextField } from "@/components/ui/field";

/** The one way in: an invitation by mail. */
export function InviteButton({ org, roles }: { org: string; roles: readonly RoleChoice[] }) {
  const [open, setOpen] = useState(false);
  return (
    <>
      <Button kind="main" onClick={() => setOpen(true)}>
        Invite somebody
      </Button>
      <Dialog open={open} onClose={() => setOpen(false)} title="Invite somebody">
        <InviteForm org={org} roles={roles} onSent={() => setOpen(false)} />
      </Dialog>
    </>
  );
}

function InviteForm({ org, roles, onSent }: { org: string; roles: readonly RoleChoice[]; onSent: () => void }) {
  const router = useRouter();
  const { busy, refusal, formProps } = useForm(async (form) => {
    const body = { name: textOf(form, "name"), email: textOf(form, "email"), roles: chosenRoles(form) };
    await api("POST /orgs/{org}/invitations", { params: { org }, body });
    onSent();
    router.refresh();
  });
  return (
    <form {...formProps} className="grid gap-4">
      <Refused refusal={refusal} />
      <TextField name="name" label="Name" autoComplete="off" error={refusal?.fields.name} required />
      <TextField
        name="email"
        label="E-mail address"
        type="email"
        autoComplete="off"
        hint="They get a link that works once and holds for seven days."
        error={refusal?.fields.email}
        required
      />
      <RoleBoxes roles={roles} chosen={[]} error={refusal?.fields.roles} />
      <Button type="submit" kind="main" disabled={busy} className="justify-self-start">
        {busy ? "Sending" : "Send the invitation"}
      </Button>
    </form>
  );
}
