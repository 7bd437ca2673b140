"use client";

import { useMutation } from "@tanstack/react-query";
import { useRouter } from "next/navigation";
import { useState } from "react";
import { leaveFor } from "@/components/accounts/leave-for";
import { Refused } from "@/components/accounts/refused";
import { useForm } from "@/components/accounts/use-form";
import { api } from "@/components/api/client";
import type { Member } from "@/components/people/member";
import { chosenRoles, RoleBoxes, type RoleChoice } from "@/components/people/role-boxes";
import { Button } from "@/components/ui/button";
import { Dialog } from "@/components/ui/dialog";
import { Notice } from "@/components/ui/notice";

type MemberDialogProps = {
  org: string;
  organisation: string;
  roles: readonly RoleChoice[];
  /** Null while nobody is being changed. */
  member: Member | null;
  onClose: () => void;
};

/** What somebody is here, and the end of their belonging here. */
export function MemberDialog({ member, onClose, ...rest }: MemberDialogProps) {
  return (
    <Dialog open={member !== null} onClose={onClose} title={member?.name ?? ""}>
      {member && (
        <div className="grid gap-6">
          <RolesForm member={member} onDone={onClose} {...rest} />
          <EndMembership member={member} onDone={onClose} {...rest} />
        </div>
      )}
    </Dialog>
  );
}

type PartProps = Pick<MemberDialogProps, "org" | "organisation" | "roles"> & { member: Member; onDone: () => void };

function RolesForm({ org, roles, member, onDone }: PartProps) {
  const router = useRouter();
  const { busy, refusal, formProps } = useForm(async (form) => {
    const params = { org, personId: member.personId };
    await api("PUT /orgs/{org}/people/{personId}/roles", { params, body: { roles: chosenRoles(form) } });
    onDone();
    router.refresh();
  });
  return (
    <form {...formProps} className="grid gap-4">
      <Refused refusal={refusal} />
      <RoleBoxes roles={roles} chosen={member.roles} error={refusal?.fields.roles} />
      <Button type="submit" kind="main" disabled={busy} className="justify-self-start">
        {busy ? "Saving" : "Save the roles"}
      </Button>
    </form>
  );
}

function EndMembership({ org, organisation, member, onDone }: PartProps) {
  const router = useRouter();
  const [asked, setAsked] = useState(false);
  const end = useMutation({
    mutationFn: () => api("DELETE /orgs/{org}/people/{personId}", { params: { org, personId: member.personId } }),
    onSuccess: () => {
      if (member.you) return leaveFor("/");
      onDone();
      router.refresh();
    },
  });
  return (
    <div className="grid gap-3 border-t-2 border-steel pt-4">
      <h3 className="text-[1.2rem]">Leaves {organisation}</h3>
      {end.error && <Notice kind="error" title={end.error.message} />}
      {asked ? (
        <>
          <p>
            {member.you ? "You lose" : `${member.name} loses`} sight of {organisation} at once. What was done and signed stays, and a new
            invitation brings {member.you ? "you" : "them"} back.
          </p>
          <div className="flex flex-wrap gap-3">
            <Button kind="main" disabled={end.isPending} onClick={() => end.mutate()}>
              End the membership now
            </Button>
            <Button onClick={() => setAsked(false)}>Keep it</Button>
          </div>
        </>
      ) : (
        <Button className="justify-self-start" onClick={() => setAsked(true)}>
          End the membership
        </Button>
      )}
    </div>
  );
}
