import type { CredentialsConfig } from "next-auth/providers/credentials";
import { beforeEach, expect, test } from "vitest";
import { findSessionPerson } from "@/db/queries/people";
import { authOptions } from "@/lib/auth/options";
import { hashPassword } from "@/lib/auth/passwords";
import type { Actor } from "@/lib/core/roles";
import { testDatabase } from "../../support/database";
import { createMember, createOrganisation } from "../../support/factories";

const { db } = testDatabase();

const PASSWORD = "four patient brass hinges";
let mentor: Actor;

beforeEach(async () => {
  mentor = await createMember(await createOrganisation(), "mentor", { passwordHash: await hashPassword(PASSWORD) });
});

// The sign-in library keeps what it was given under `options`.
const provider = authOptions.providers[0] as unknown as { options: CredentialsConfig };
const signIn = (email: string, password: string, userAgent = "test") =>
  provider.options.authorize({ email, password }, { headers: { "user-agent": userAgent }, body: {}, query: {}, method: "POST" });

test("the right password opens a session of its own, whatever the case of the address", async () => {
  const [first, second] = [await signIn(mentor.email, PASSWORD), await signIn(` ${mentor.email.toUpperCase()} `, PASSWORD, "x".repeat(500))];
  expect(first?.sessionId).not.toBe(second?.sessionId);
  expect(await findSessionPerson(db(), second?.sessionId ?? "")).toMatchObject({ personId: mentor.personId });
  expect(await db()("sessions").where({ id: second?.sessionId }).first("device")).toEqual({ device: "x".repeat(200) });
});

test("a wrong password, an unknown address, a suspended person and one who never set a password all get the same nothing", async () => {
  expect(await signIn(mentor.email, `${PASSWORD}.`)).toBeNull();
  expect(await signIn("nobody-here@people.test", PASSWORD)).toBeNull();
  expect(await signIn((await createMember(mentor.organisation, "mentor")).email, "")).toBeNull();
  await db()("people").where({ id: mentor.personId }).update({ suspended_at: db().fn.now() });
  expect(await signIn(mentor.email, PASSWORD)).toBeNull();
  expect(await db()("sessions").where({ person_id: mentor.personId })).toHaveLength(0);
});

test.each([true, false])("the eleventh try within a quarter of an hour is refused, address known: %s", async (known) => {
  const email = known ? mentor.email : `unknown-${mentor.personId}@people.test`;
  for (let guess = 0; guess < 10; guess += 1) expect(await signIn(email, `guess ${guess}`)).toBeNull();
  await expect(signIn(email, PASSWORD)).rejects.toThrow("too_many");
});

test("the cookie's token carries who and which session, and nothing that decides", async () => {
  const user = { id: mentor.personId, sessionId: "s-1", name: "N", email: "e@x.test", roles: ["manager"] };
  const token = await authOptions.callbacks?.jwt?.({ token: { name: "N", email: "e@x.test" }, user, account: null });
  expect(token).toEqual({ sub: mentor.personId, sessionId: "s-1" });
  expect(authOptions.session?.strategy).toBe("jwt");
});

test("signing out ends the session's row", async () => {
  const user = await signIn(mentor.email, PASSWORD);
  const sessionId = user?.sessionId ?? "";
  await authOptions.events?.signOut?.({ token: { sessionId }, session: { expires: "" } });
  expect(await findSessionPerson(db(), sessionId)).toBeUndefined();
});
