import { beforeEach, describe, expect, test } from "vitest";
import { findActorRow, findPersonByEmail } from "@/db/queries/people";
import { verifyPassword } from "@/lib/auth/passwords";
import type { Actor } from "@/lib/core/roles";
import { acceptInvitation } from "@/lib/services/accounts/accept-invitation";
import { lookAtInvitation } from "@/lib/services/accounts/look-at-invitation";
import { hashToken } from "@/lib/services/accounts/single-use-link";
import { invitePerson } from "@/lib/services/people/invite-person";
import { sendInvitationAgain } from "@/lib/services/people/send-invitation-again";
import { withdrawInvitation } from "@/lib/services/people/withdraw-invitation";
import { testDatabase } from "../../support/database";
import { createMember, createOrganisation } from "../../support/factories";
import { tokenSentTo } from "../../support/letters";

const { db, owner } = testDatabase();

const PASSWORD = "seven loud anvils sing";
const person = { name: "Ina Tester", password: PASSWORD, dateOfBirth: null };
let manager: Actor;
let email: string;
let count = 0;

beforeEach(async () => {
  manager = await createMember(await createOrganisation(), "manager");
  email = `invited-${++count}@people.test`;
});

async function invite(by: Actor = manager, roles: ("mentor" | "apprentice" | "assessor")[] = ["mentor"]) {
  const { invitationId } = await invitePerson(by, { name: "Ina Tester", email, roles });
  return { invitationId, token: await tokenSentTo(email) };
}

test("only the hash of the token is stored, and the letter's link has it behind the #", async () => {
  const { token } = await invite();
  expect(token).toMatch(/^[\w-]{43}$/); // 32 bytes in base64url (RFC 4648, section 5) are 43 characters
  const rows = await db()("invitations").where({ email });
  expect(rows).toHaveLength(1);
  expect(rows[0].token_hash).toBe(hashToken(token));
  expect(JSON.stringify(rows)).not.toContain(token);
});

test("somebody new sees what they are invited to, chooses a password and belongs", async () => {
  const { token } = await invite(manager, ["apprentice", "mentor"]);
  expect(await lookAtInvitation(null, token)).toMatchObject({
    organisation: manager.organisation.name,
    email,
    invitedBy: manager.name,
    roles: ["apprentice", "mentor"],
    you: "new",
    signedInAs: null,
  });
  const dateOfBirth = "2009-05-04";
  expect(await acceptInvitation(null, { token, person: { ...person, dateOfBirth } })).toEqual({ org: manager.organisation.slug, email });
  const made = await findPersonByEmail(db(), email);
  expect(await verifyPassword(made?.passwordHash ?? null, PASSWORD)).toBe(true);
  expect((await findActorRow(db(), made?.id ?? "", manager.organisation.slug))?.roles).toEqual(new Set(["apprentice", "mentor"]));
  expect(await db()("people").where({ email }).first("date_of_birth")).toEqual({ date_of_birth: dateOfBirth });
});

test("somebody who exists elsewhere signs in first and accepts with one press", async () => {
  const elsewhere = await createMember(await createOrganisation("college"), "assessor", { email });
  const { token } = await invite(manager, ["assessor"]);
  expect((await lookAtInvitation(null, token)).you).toBe("sign_in");
  await expect(acceptInvitation(null, { token, person })).rejects.toMatchObject({ code: "unauthenticated" });
  expect((await findPersonByEmail(db(), email))?.passwordHash).toBeNull(); // a stranger's password was not set
  expect((await lookAtInvitation(elsewhere, token)).you).toBe("ready");
  await acceptInvitation(elsewhere, { token });
  expect((await findActorRow(db(), elsewhere.personId, manager.organisation.slug))?.roles).toEqual(new Set(["assessor"]));
  expect(await db()("people").where({ email })).toHaveLength(1);
});

test("signed in as somebody else, nobody accepts", async () => {
  const other = await createMember(await createOrganisation(), "mentor");
  const { token } = await invite();
  expect(await lookAtInvitation(other, token)).toMatchObject({ you: "someone_else", signedInAs: other.email });
  await expect(acceptInvitation(other, { token })).rejects.toMatchObject({ code: "forbidden" });
});

describe("a link that can't be used any more says why", () => {
  test("used", async () => {
    const { token } = await invite();
    await acceptInvitation(null, { token, person });
    await expect(lookAtInvitation(null, token)).rejects.toMatchObject({ code: "gone", message: expect.stringMatching(/used already/) });
    await expect(acceptInvitation(null, { token, person })).rejects.toMatchObject({ code: "gone" });
  });

  test("expired", async () => {
    const { token, invitationId } = await invite();
    await owner()("invitations").where({ id: invitationId }).update({ expires_at: owner().raw("now() - interval '1 second'") });
    await expect(lookAtInvitation(null, token)).rejects.toMatchObject({ code: "gone", message: expect.stringMatching(/expired/) });
    await expect(acceptInvitation(null, { token, person })).rejects.toMatchObject({ code: "gone" });
    expect(await findPersonByEmail(db(), email)).toBeUndefined();
  });

  test("withdrawn", async () => {
    const { token, invitationId } = await invite();
    await withdrawInvitation(manager, invitationId);
    await expect(acceptInvitation(null, { token, person })).rejects.toMatchObject({
      code: "gone",
      message: expect.stringMatching(/withdrawn/),
    });
  });

  test("replaced by a newer letter", async () => {
    const { token: old, invitationId } = await invite();
    await sendInvitationAgain(manager, invitationId);
    const newer = await tokenSentTo(email);
    expect(newer).not.toBe(old);
    await expect(acceptInvitation(null, { token: old, person })).rejects.toMatchObject({ code: "gone" });
    await acceptInvitation(null, { token: newer, person });
  });

  test.each(["", "x", "A".repeat(43)])("never given out: %j", async (token) => {
    await expect(acceptInvitation(null, { token, person })).rejects.toMatchObject({ code: "gone" });
  });
});

test("a poor password is refused and the link still works", async () => {
  const { token } = await invite();
  await expect(acceptInvitation(null, { token, person: { ...person, password: "too short" } })).rejects.toMatchObject({
    code: "invalid_input",
    problems: [{ path: "password" }],
  });
  await acceptInvitation(null, { token, person });
});

test("two tabs of somebody new accept at once: one person, one membership", async () => {
  const { token } = await invite();
  const results = await Promise.allSettled([1, 2, 3].map(() => acceptInvitation(null, { token, person })));
  expect(results.filter(({ status }) => status === "fulfilled")).toHaveLength(1);
  const people = await db()("people").where({ email });
  expect(people).toHaveLength(1);
  expect(await db()("memberships").where({ person_id: people[0].id })).toHaveLength(1);
});

test("two tabs of somebody signed in accept at once: both arrive, one membership", async () => {
  const elsewhere = await createMember(await createOrganisation("college"), "assessor", { email });
  const { token } = await invite(manager, ["assessor"]);
  const answers = await Promise.all([1, 2].map(() => acceptInvitation(elsewhere, { token })));
  expect(answers.map(({ org }) => org)).toEqual([manager.organisation.slug, manager.organisation.slug]);
  expect(await db()("memberships").where({ person_id: elsewhere.personId, organisation_id: manager.organisation.id })).toHaveLength(1);
});

test("two organisations invite the same new address and both are accepted at once: one person, whose password is one of the two", async () => {
  const second = await createMember(await createOrganisation("college"), "manager");
  const first = await invite();
  await invitePerson(second, { name: "Ina Tester", email, roles: ["assessor"] });
  const tokens = [first.token, await tokenSentTo(email)];
  const results = await Promise.allSettled(tokens.map((token) => acceptInvitation(null, { token, person })));
  expect(results.filter(({ status }) => status === "fulfilled")).toHaveLength(1);
  const refused = results.find((result) => result.status === "rejected");
  expect(refused).toMatchObject({ reason: { code: "unauthenticated" } });
  expect(await db()("people").where({ email })).toHaveLength(1);
});

test("who joined meanwhile keeps the old roles beside the new ones", async () => {
  const { token } = await invite(manager, ["assessor"]);
  const joined = await createMember(manager.organisation, "mentor", { email });
  await acceptInvitation(joined, { token });
  expect((await findActorRow(db(), joined.personId, manager.organisation.slug))?.roles).toEqual(new Set(["mentor", "assessor"]));
});

test("who left can be invited back; the years before stay", async () => {
  const former = await createMember(manager.organisation, "mentor", { email });
  await db()("memberships").where({ person_id: former.personId }).update({ ended_at: db().fn.now() });
  const { token } = await invite();
  await acceptInvitation(former, { token });
  expect(await db()("memberships").where({ person_id: former.personId })).toHaveLength(2);
});
