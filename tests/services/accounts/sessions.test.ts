import { expect, test } from "vitest";
import { findSessionPerson } from "@/db/queries/people";
import { startSession } from "@/db/queries/sessions";
import { findWayIn } from "@/lib/services/accounts/find-way-in";
import { signOutDevice } from "@/lib/services/accounts/sign-out-device";
import { signOutEverywhere } from "@/lib/services/accounts/sign-out-everywhere";
import { suspendPerson } from "@/lib/services/accounts/suspend-person";
import { viewAccount } from "@/lib/services/accounts/view-account";
import { testDatabase } from "../../support/database";
import { createMember, createOrganisation } from "../../support/factories";

const { db } = testDatabase();

const PHONE = "Mozilla/5.0 (Linux; Android 14; K) AppleWebKit/537.36 (KHTML, like Gecko) Chrome/140.0.0.0 Mobile Safari/537.36";

async function signedInMember() {
  const member = await createMember(await createOrganisation(), ["mentor", "assessor"]);
  return { ...member, sessionId: await startSession(db(), { personId: member.personId, device: PHONE, days: 14 }) };
}

test("the account shows one's own roles and devices and nobody else's", async () => {
  const [member, stranger] = [await signedInMember(), await signedInMember()];
  await startSession(db(), { personId: member.personId, device: "", days: 14 });
  const account = await viewAccount(member);
  expect(account.posts.map(({ roleLabel, href }) => [roleLabel, href])).toEqual([
    ["mentor", `/o/${member.organisation.slug}/today?as=mentor`],
    ["assessor", `/o/${member.organisation.slug}/today?as=assessor`],
  ]);
  expect(account.sessions.map(({ here }) => here).sort()).toEqual([false, true]);
  expect(account.sessions.find(({ here }) => here)?.device).toBe("Chrome on Android");
  expect(account.sessions.map(({ id }) => id)).not.toContain(stranger.sessionId);
});

test("signing out one device leaves the others; somebody else's device is not there", async () => {
  const [member, stranger] = [await signedInMember(), await signedInMember()];
  const other = await startSession(db(), { personId: member.personId, device: PHONE, days: 14 });
  await signOutDevice(member, other);
  expect(await findSessionPerson(db(), other)).toBeUndefined();
  expect(await findSessionPerson(db(), member.sessionId)).toBeDefined();
  await expect(signOutDevice(member, other)).rejects.toMatchObject({ code: "not_found" });
  await expect(signOutDevice(member, stranger.sessionId)).rejects.toMatchObject({ code: "not_found" });
  expect(await findSessionPerson(db(), stranger.sessionId)).toBeDefined();
});

test("signing out everywhere ends all of one's own sessions at once", async () => {
  const [member, stranger] = [await signedInMember(), await signedInMember()];
  await startSession(db(), { personId: member.personId, device: PHONE, days: 14 });
  expect(await signOutEverywhere(member)).toEqual({ ended: 2 });
  expect(await findSessionPerson(db(), member.sessionId)).toBeUndefined();
  expect(await findSessionPerson(db(), stranger.sessionId)).toBeDefined();
});

test("suspending somebody ends their sessions at once; restoring does not bring those back", async () => {
  const member = await signedInMember();
  await suspendPerson(` ${member.email.toUpperCase()} `, true);
  expect(await findSessionPerson(db(), member.sessionId)).toBeUndefined();
  await suspendPerson(member.email, false);
  expect(await findSessionPerson(db(), member.sessionId)).toBeUndefined();
  const again = await startSession(db(), { personId: member.personId, device: PHONE, days: 14 });
  expect(await findSessionPerson(db(), again)).toBeDefined();
  await expect(suspendPerson("nobody@people.test", true)).rejects.toMatchObject({ code: "not_found" });
});

test("the way in: one organisation leads to its today, several to the choice, none to nowhere", async () => {
  const member = await signedInMember();
  expect(await findWayIn(member.personId)).toBe(`/o/${member.organisation.slug}/today`);
  const second = await createOrganisation("college");
  await db()("memberships").insert({ organisation_id: second.id, person_id: member.personId, roles: ["assessor"] });
  expect(await findWayIn(member.personId)).toBe("/o");
  await db()("memberships").where({ person_id: member.personId }).update({ ended_at: db().fn.now() });
  expect(await findWayIn(member.personId)).toBeUndefined();
});
