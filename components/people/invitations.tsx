"use client";

import { useMutation } from "@tanstack/react-query";
import { useRouter } from "next/navigation";
import { api } from "@/components/api/client";
import { rolesInWords, type RoleChoice } from "@/components/people/role-boxes";
import { Button } from "@/components/ui/button";
import { Notice } from "@/components/ui/notice";
import { Tag } from "@/components/ui/tag";
import type { Role } from "@/lib/core/roles";

type Invitation = { id: string; name: string; email: string; roles: Role[]; until: string; expired: boolean };

/** Who was asked and has not answered, to be asked again or no longer. */
export function Invitations({ org, roles, invitations }: { org: string; roles: readonly RoleChoice[]; invitations: readonly Invitation[] }) {
  const router = useRouter();
  const done = { onSuccess: () => router.refresh() };
  const again = useMutation({
    mutationFn: ({ id: invitationId }: Invitation) =>
      api("POST /orgs/{org}/invitations/{invitationId}/letters", { params: { org, invitationId } }),
    ...done,
  });
  const withdraw = useMutation({
    mutationFn: ({ id: invitationId }: Invitation) => api("DELETE /orgs/{org}/invitations/{invitationId}", { params: { org, invitationId } }),
    ...done,
  });
  const busy = again.isPending || withdraw.isPending;
  const refused = again.error ?? withdraw.error;
  return (
    <div className="grid gap-3">
      {refused && <Notice kind="error" title={refused.message} />}
      {again.isSuccess && !refused && <Notice kind="done" title={`Sent again to ${again.variables.email}. The older link no longer works.`} />}
      <ul>
        {invitations.map((invitation) => (
          <li
            key={invitation.id}
            className="flex flex-wrap items-center justify-between gap-x-6 gap-y-2 border-b border-rule py-3 last:border-b-0"
          >
            <div className="min-w-0">
              <p>
                <b>{invitation.name}</b> <span className="break-all text-ink2">{invitation.email}</span>
              </p>
              <p className="text-sm text-ink2">
                {rolesInWords(roles, invitation.roles)} ·{" "}
                {invitation.expired ? <Tag kind="strong">link expired</Tag> : `link holds until ${invitation.until}`}
              </p>
            </div>
            <div className="flex flex-wrap gap-2">
              <Button disabled={busy} onClick={() => again.mutate(invitation)} aria-label={`Send again to ${invitation.name}`}>
                Send again
              </Button>
              <Button kind="quiet" disabled={busy} onClick={() => withdraw.mutate(invitation)} aria-label={`Withdraw the invitation of ${invitation.name}`}>
                Withdraw
              </Button>
            </div>
          </li>
        ))}
      </ul>
    </div>
  );
}
