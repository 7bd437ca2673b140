"use client";

import type { Member } from "@/components/people/member";
import { useState } from "react";
import { MemberDialog } from "@/components/people/member-dialog";
import { rolesInWords, type RoleChoice } from "@/components/people/role-boxes";
import { Button } from "@/components/ui/button";
import { SelectField, TextField } from "@/components/ui/field";
import { Tag } from "@/components/ui/tag";
import { formatDay } from "@/lib/core/dates";
import type { Role } from "@/lib/core/roles";


type MembersProps = { org: string; organisation: string; roles: readonly RoleChoice[]; members: readonly Member[] };

const SORTS = {
  name: (a: Member, b: Member) => a.name.localeCompare(b.name),
  joinedOn: (a: Member, b: Member) => b.joinedOn.localeCompare(a.joinedOn) || a.name.localeCompare(b.name),
};
type Sort = keyof typeof SORTS;

/** Everybody who belongs here: a table on a desk, a card each on a phone. */
export function Members({ org, organisation, roles, members }: MembersProps) {
  const [sought, setSought] = useState("");
  const [role, setRole] = useState("");
  const [sort, setSort] = useState<Sort>("name");
  const [changing, setChanging] = useState<Member | null>(null);
  const words = sought.trim().toLowerCase();
  const shown = members
    .filter((member) => (role === "" || member.roles.includes(role as Role)) && `${member.name} ${member.email}`.toLowerCase().includes(words))
    .sort(SORTS[sort]);

  const heading = (by: Sort, label: string) => (
    <th scope="col" className="px-4 py-1" aria-sort={sort === by ? (by === "name" ? "ascending" : "descending") : "none"}>
      <button type="button" onClick={() => setSort(by)} className="min-h-11 font-semibold">
        {label}
        <span aria-hidden className={sort === by ? "" : "invisible"}>
          {by === "name" ? " ▴" : " ▾"}
        </span>
      </button>
    </th>
  );
  return (
    <>
      <div className="grid gap-3 border-b border-rule px-4 py-4 sm:grid-cols-[20rem_14rem_1fr] sm:px-5">
        <TextField label="Find" type="search" value={sought} onChange={(event) => setSought(event.target.value)} autoComplete="off" />
        <SelectField label="Role" value={role} onChange={(event) => setRole(event.target.value)}>
          <option value="">All</option>
          {roles.map((choice) => (
            <option key={choice.role} value={choice.role}>
              {choice.label}
            </option>
          ))}
        </SelectField>
        <p className="self-end pb-2.5 text-ink2 sm:text-right" role="status">
          {shown.length === members.length ? `${members.length} people` : `${shown.length} of ${members.length} people`}
        </p>
      </div>
      <table className="w-full text-left max-sm:block">
        <caption className="sr-only">People of {organisation}</caption>
        <thead className="border-b-2 border-steel text-[1.1rem] max-sm:sr-only">
          <tr>
            {heading("name", "Name")}
            <th scope="col" className="px-4">
              Roles
            </th>
            {heading("joinedOn", "Joined")}
            <td />
          </tr>
        </thead>
        <tbody className="max-sm:block">
          {shown.map((member) => (
            <tr key={member.personId} className="border-b border-rule last:border-b-0 max-sm:grid max-sm:grid-cols-[1fr_auto] max-sm:px-4 max-sm:py-3">
              <th scope="row" className="min-w-0 px-4 py-2 font-sans tracking-normal max-sm:p-0">
                {member.name} {member.you && <Tag>you</Tag>} {member.suspended && <Tag kind="strong">suspended</Tag>}
                <span className="block text-sm font-normal text-ink2 [overflow-wrap:anywhere]">{member.email}</span>
              </th>
              <td className="px-4 py-2 max-sm:col-span-2 max-sm:row-start-2 max-sm:p-0 max-sm:pt-1.5">{rolesInWords(roles, member.roles)}</td>
              <td className="whitespace-nowrap px-4 py-2 text-ink2 max-sm:col-span-2 max-sm:p-0 max-sm:text-sm">
                <span className="sm:hidden">joined </span>
                {formatDay(member.joinedOn)}
              </td>
              <td className="px-4 py-1 text-right max-sm:col-start-2 max-sm:row-start-1 max-sm:p-0">
                <Button onClick={() => setChanging(member)} aria-label={`Change ${member.name}`}>
                  Change
                </Button>
              </td>
            </tr>
          ))}
        </tbody>
      </table>
      {shown.length === 0 && <p className="px-5 py-6 text-ink2">Nobody here fits that.</p>}
      <MemberDialog org={org} organisation={organisation} roles={roles} member={changing} onClose={() => setChanging(null)} />
    </>
  );
}
