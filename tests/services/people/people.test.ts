import { expect, test } from "vitest";
import { findActorRow } from "@/db/queries/people";
import { ROLES, type Actor, type Role } from "@/lib/core/roles";
import { changeRoles } from "@/lib/services/people/change-roles";
import { endMembership } from "@/lib/services/people/end-membership";
import { inviteFirstManager } from "@/lib/services/people/invite-first-manager";
import { invitePerson } from "@/lib/services/people/invite-person";
import { sendInvitationAgain } from "@/lib/services/people/send-invitation-again";
import { viewPeople } from "@/lib/services/people/view-people";
import { withdrawInvitation } from "@/lib/services/people/withdraw-invitation";
import { acceptInvitation } from "@/lib/services/accounts/accept-invitation";
import { testDatabase } from "../../support/database";
import { createMember, createOrganisation } from "../../support/factories";
import { lettersTo, tokenSentTo } from "../../support/letters";

const { db } = testDatabase();

let count = 0;
const someAddress = () => `person-${++count}@people.test`;
const rolesNow = async (member: Actor) => (await findActorRow(db(), member.personId, member.organisation.slug))?.roles;

test.each(ROLES.filter((role) => role !== "manager"))("a %s says nothing about who belongs here", async (role: Role) => {
  const kind = ["liaison", "verifier"].includes(role) ? "college" : "workshop";
  const organisation = await createOrganisation(kind);
  const [actor, manager] = [await createMember(organisation, role), await createMember(organisation, "manager")];
  const { invitationId } = await invitePerson(manager, { name: "N", email: someAddress(), roles: ["apprentice"] });
  const refused = { code: "forbidden" };
  await expect(viewPeople(actor)).rejects.toMatchObject(refused);
  await expect(invitePerson(actor, { name: "N", email: someAddress(), roles: ["apprentice"] })).rejects.toMatchObject(refused);
  await expect(withdrawInvitation(actor, invitationId)).rejects.toMatchObject(refused);
  await expect(sendInvitationAgain(actor, invitationId)).rejects.toMatchObject(refused);
  await expect(changeRoles(actor, actor.personId, ["manager"])).rejects.toMatchObject(refused);
  await expect(endMembership(actor, manager.personId)).rejects.toMatchObject(refused);
});

test("a manager of another organisation finds neither its people nor its invitations", async () => {
  const [ours, theirs] = [await createMember(await createOrganisation(), "manager"), await createMember(await createOrganisation(), "manager")];
  const mentor = await createMember(ours.organisation, "mentor");
  const { invitationId } = await invitePerson(ours, { name: "N", email: someAddress(), roles: ["mentor"] });
  const absent = { code: "not_found" };
  await expect(changeRoles(theirs, mentor.personId, ["assessor"])).rejects.toMatchObject(absent);
  await expect(endMembership(theirs, mentor.personId)).rejects.toMatchObject({ code: expect.stringMatching(/not_found|conflict/) });
  await expect(withdrawInvitation(theirs, invitationId)).rejects.toMatchObject(absent);
  await expect(sendInvitationAgain(theirs, invitationId)).rejects.toMatchObject(absent);
  const seen = await viewPeople(theirs);
  expect(seen.members.map(({ personId }) => personId)).toEqual([theirs.personId]);
  expect(seen.invitations).toEqual([]);
});

test.each([
  ["workshop", "verifier"],
  ["workshop", "liaison"],
  ["college", "mentor"],
] as const)("a %s has no %s", async (kind, role) => {
  const manager = await createMember(await createOrganisation(kind), "manager");
  const wrong = { code: "invalid_input", problems: [{ path: "roles" }] };
  await expect(invitePerson(manager, { name: "N", email: someAddress(), roles: [role] })).rejects.toMatchObject(wrong);
  await expect(changeRoles(manager, manager.personId, ["manager", role])).rejects.toMatchObject(wrong);
});

test("an address is invited once at a time, even from two tabs at once, and not where it belongs already", async () => {
  const manager = await createMember(await createOrganisation(), "manager");
  const email = someAddress();
  const results = await Promise.allSettled([1, 2, 3].map(() => invitePerson(manager, { name: "N", email, roles: ["mentor"] })));
  expect(results.filter(({ status }) => status === "fulfilled")).toHaveLength(1);
  expect(await lettersTo(email)).toHaveLength(1);
  await expect(invitePerson(manager, { name: "N", email: manager.email, roles: ["mentor"] })).rejects.toMatchObject({ code: "conflict" });
});

test("inviting an address that somebody elsewhere has looks just like inviting a new one", async () => {
  const manager = await createMember(await createOrganisation(), "manager");
  const elsewhere = await createMember(await createOrganisation(), "mentor");
  const answer = await invitePerson(manager, { name: "N", email: elsewhere.email, roles: ["mentor"] });
  expect(Object.keys(answer)).toEqual(["invitationId"]);
  const [waiting] = (await viewPeople(manager)).invitations;
  expect(waiting?.name).toBe("N"); // what the manager typed, not the name that the person goes by elsewhere
});

test("an accepted or withdrawn invitation is neither sent again nor withdrawn", async () => {
  const manager = await createMember(await createOrganisation(), "manager");
  const email = someAddress();
  const { invitationId } = await invitePerson(manager, { name: "N", email, roles: ["mentor"] });
  const token = await tokenSentTo(email);
  await acceptInvitation(null, { token, person: { name: "N", password: "nine wooden clocks tick", dateOfBirth: null } });
  await expect(withdrawInvitation(manager, invitationId)).rejects.toMatchObject({ code: "conflict" });
  await expect(sendInvitationAgain(manager, invitationId)).rejects.toMatchObject({ code: "conflict" });
});

test("a hundred letters an hour, then no more", async () => {
  const manager = await createMember(await createOrganisation(), "manager");
  await db().raw(`INSERT INTO rate_limits (key, window_start, count)
    VALUES (?, to_timestamp(floor(extract(epoch FROM now()) / 3600) * 3600), 100)`, [`invite:${manager.organisation.id}`]);
  await expect(invitePerson(manager, { name: "N", email: someAddress(), roles: ["mentor"] })).rejects.toMatchObject({ code: "too_many" });
});

test("roles change at the next request", async () => {
  const manager = await createMember(await createOrganisation(), "manager");
  const mentor = await createMember(manager.organisation, "mentor");
  await changeRoles(manager, mentor.personId, ["mentor", "assessor"]);
  expect(await rolesNow(mentor)).toEqual(new Set(["mentor", "assessor"]));
});

test("a membership that ended is gone at the next request, and its row stays", async () => {
  const manager = await createMember(await createOrganisation(), "manager");
  const mentor = await createMember(manager.organisation, "mentor");
  await endMembership(manager, mentor.personId);
  expect(await rolesNow(mentor)).toBeUndefined();
  expect(await db()("memberships").where({ person_id: mentor.personId })).toHaveLength(1);
  await expect(endMembership(manager, mentor.personId)).rejects.toMatchObject({ code: "not_found" });
});

test("the last manager neither leaves nor stops being one", async () => {
  const manager = await createMember(await createOrganisation(), ["manager", "mentor"]);
  await expect(endMembership(manager, manager.personId)).rejects.toMatchObject({ code: "conflict" });
  await expect(changeRoles(manager, manager.personId, ["mentor"])).rejects.toMatchObject({ code: "conflict" });
  await createMember(manager.organisation, "manager");
  await changeRoles(manager, manager.personId, ["mentor"]);
  expect(await rolesNow(manager)).toEqual(new Set(["mentor"]));
});

test("two managers who end each other at the same moment leave one of them", async () => {
  const first = await createMember(await createOrganisation(), "manager");
  const second = await createMember(first.organisation, "manager");
  const results = await Promise.allSettled([endMembership(first, second.personId), endMembership(second, first.personId)]);
  expect(results.map(({ status }) => status).sort()).toEqual(["fulfilled", "rejected"]);
  const left = [await rolesNow(first), await rolesNow(second)].filter(Boolean);
  expect(left).toEqual([new Set(["manager"])]);
});

test("an installation's first manager is invited by nobody and founds the rest", async () => {
  const email = someAddress();
  const of = { organisation: "First Works", kind: "workshop", slug: `first-${count}`, name: "F. Founder", email } as const;
  const { link } = await inviteFirstManager(of);
  expect(link).toMatch(/^http:\/\/app\.test\/join#[\w-]{43}$/);
  await expect(inviteFirstManager(of)).rejects.toMatchObject({ code: "conflict" });
  const person = { name: "F. Founder", password: "nine wooden clocks tick", dateOfBirth: null };
  await acceptInvitation(null, { token: link.split("#")[1] ?? "", person });
  const made = await db()("people").where({ email }).first("id");
  expect((await findActorRow(db(), made.id, of.slug))?.roles).toEqual(new Set(["manager"]));
});
