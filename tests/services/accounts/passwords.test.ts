import { beforeEach, expect, test } from "vitest";
import { findPersonByEmail, findSessionPerson } from "@/db/queries/people";
import { startSession } from "@/db/queries/sessions";
import { hashPassword, verifyPassword } from "@/lib/auth/passwords";
import type { Actor } from "@/lib/core/roles";
import { askForNewPassword } from "@/lib/services/accounts/ask-for-new-password";
import { changePassword } from "@/lib/services/accounts/change-password";
import { setNewPassword } from "@/lib/services/accounts/set-new-password";
import { testDatabase } from "../../support/database";
import { createMember, createOrganisation } from "../../support/factories";
import { lettersTo, tokenSentTo } from "../../support/letters";

const { db, owner } = testDatabase();

const OLD = "four patient brass hinges";
const NEW = "eleven quiet copper kettles";
let mentor: Actor;

beforeEach(async () => {
  const member = await createMember(await createOrganisation(), "mentor", { passwordHash: await hashPassword(OLD) });
  mentor = { ...member, sessionId: await signInOnADevice(member.personId) };
});

const signInOnADevice = (personId: string) => startSession(db(), { personId, device: "test", days: 14 });
const fits = async (password: string) => verifyPassword((await findPersonByEmail(db(), mentor.email))?.passwordHash ?? null, password);

test("the answer is the same, and takes as long, whether anybody has the address or not; only one gets a letter", async () => {
  const timed = async (email: string) => {
    const began = performance.now();
    return { answer: await askForNewPassword(email), ms: performance.now() - began };
  };
  const known = await timed(mentor.email);
  const unknown = await timed("nobody-at-all@people.test");
  expect(known.answer).toEqual(unknown.answer);
  // Both wait for the same floor, which is longer than writing the letter takes.
  for (const { ms } of [known, unknown]) expect(ms).toBeGreaterThan(390);
  expect(await lettersTo(mentor.email)).toHaveLength(1);
  expect(await lettersTo("nobody-at-all@people.test")).toHaveLength(0);
});

test.each([true, false])("the fifth letter within an hour is refused, address known: %s", async (known) => {
  const email = known ? mentor.email : `unknown-${mentor.personId}@people.test`;
  for (let ask = 0; ask < 4; ask += 1) await askForNewPassword(email);
  await expect(askForNewPassword(email)).rejects.toMatchObject({ code: "too_many" });
});

test("the link sets the password once, ends every session and closes the other links", async () => {
  const sessions = [mentor.sessionId, await signInOnADevice(mentor.personId)];
  await askForNewPassword(mentor.email);
  const earlier = await tokenSentTo(mentor.email);
  await askForNewPassword(mentor.email);
  const token = await tokenSentTo(mentor.email);
  expect(JSON.stringify(await db()("password_resets").where({ person_id: mentor.personId }))).not.toContain(token);

  await expect(setNewPassword({ token, password: "short" })).rejects.toMatchObject({ code: "invalid_input" });
  expect(await setNewPassword({ token, password: NEW })).toEqual({ email: mentor.email });
  expect([await fits(OLD), await fits(NEW)]).toEqual([false, true]);
  for (const id of sessions) expect(await findSessionPerson(db(), id)).toBeUndefined();
  for (const used of [token, earlier]) await expect(setNewPassword({ token: used, password: OLD })).rejects.toMatchObject({ code: "gone" });
  expect((await lettersTo(mentor.email)).map(({ subject }) => subject)).toContain("Your password was changed");
});

test("an expired link says so", async () => {
  await askForNewPassword(mentor.email);
  const token = await tokenSentTo(mentor.email);
  await owner()("password_resets").where({ person_id: mentor.personId }).update({ expires_at: owner().raw("now() - interval '1 second'") });
  await expect(setNewPassword({ token, password: NEW })).rejects.toMatchObject({ code: "gone", message: expect.stringMatching(/expired/) });
  expect(await fits(OLD)).toBe(true);
});

test("used in two tabs at once, the link sets one password", async () => {
  await askForNewPassword(mentor.email);
  const token = await tokenSentTo(mentor.email);
  const results = await Promise.allSettled([NEW, `${NEW} too`].map((password) => setNewPassword({ token, password })));
  expect(results.filter(({ status }) => status === "fulfilled")).toHaveLength(1);
});

test("a suspended person gets no letter and can't use an earlier one", async () => {
  await askForNewPassword(mentor.email);
  const token = await tokenSentTo(mentor.email);
  await db()("people").where({ id: mentor.personId }).update({ suspended_at: db().fn.now() });
  await askForNewPassword(mentor.email);
  expect(await lettersTo(mentor.email)).toHaveLength(1);
  await expect(setNewPassword({ token, password: NEW })).rejects.toMatchObject({ code: "gone" });
});

test("changing it asks for the old one, keeps this device and signs out the others", async () => {
  const other = await signInOnADevice(mentor.personId);
  await expect(changePassword(mentor, { current: "not the old one", next: NEW })).rejects.toMatchObject({
    code: "forbidden",
    problems: [{ path: "current" }],
  });
  await expect(changePassword(mentor, { current: OLD, next: OLD })).rejects.toMatchObject({ code: "invalid_input" });
  await expect(changePassword(mentor, { current: OLD, next: "short" })).rejects.toMatchObject({ problems: [{ path: "next" }] });
  expect(await changePassword(mentor, { current: OLD, next: NEW })).toEqual({ otherSessionsEnded: 1 });
  expect(await fits(NEW)).toBe(true);
  expect(await findSessionPerson(db(), mentor.sessionId)).toBeDefined();
  expect(await findSessionPerson(db(), other)).toBeUndefined();
});

test("guessing the old one at an unlocked device stops after ten tries", async () => {
  for (let guess = 0; guess < 10; guess += 1) {
    await expect(changePassword(mentor, { current: `guess ${guess}`, next: NEW })).rejects.toMatchObject({ code: "forbidden" });
  }
  await expect(changePassword(mentor, { current: OLD, next: NEW })).rejects.toMatchObject({ code: "too_many" });
});
