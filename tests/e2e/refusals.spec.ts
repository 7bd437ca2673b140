import { createHash, randomBytes, randomUUID } from "node:crypto";
import { writeFileSync } from "node:fs";
import { expect, test, type Page } from "@playwright/test";
import { personId, recordingId, taskId } from "@/db/seeds/demo/ids";
import { inFolder, ownerDb, PHONE, signIn } from "../support/e2e";

/** Calls a door as the page's person, from the page. */
async function call(page: Page, method: string, path: string, body?: unknown): Promise<{ status: number; body: Record<string, unknown> }> {
  return page.evaluate(
    async ([verb, address, sent]) => {
      const response = await fetch(`/api/v1${address}`, {
        method: verb as string,
        ...(sent === undefined ? {} : { body: JSON.stringify(sent), headers: { "content-type": "application/json" } }),
      });
      return { status: response.status, body: (await response.json().catch(() => ({}))) as Record<string, unknown> };
    },
    [method, path, body] as const,
  );
}

test("another role's pages aren't there, and its doors are shut", async ({ browser }) => {
  const { page } = await signIn(browser, "asha@demo.invalid", PHONE);
  expect((await page.goto("/o/vennick/recordings"))?.status()).toBe(404);
  expect((await page.goto("/o/vennick/people"))?.status()).toBe(404);
  expect((await call(page, "POST", "/orgs/vennick/modules", { title: "Mine", recordingId: null })).status).toBe(403);
});

test("another organisation looks like one that doesn't exist", async ({ browser }) => {
  const { page } = await signIn(browser, "sunniva@demo.invalid");
  expect((await page.goto("/o/saltmarsh/today"))?.status()).toBe(404);
  expect((await page.goto("/o/nowhere/today"))?.status()).toBe(404);
  expect((await call(page, "GET", `/orgs/saltmarsh/recordings/${recordingId("front-brake-discs")}/marking`)).status).toBe(404);
});

test("nobody observes or signs off their own work", async ({ browser }) => {
  const db = ownerDb();
  await db.raw(`UPDATE memberships SET roles = ARRAY['apprentice', 'assessor'] WHERE person_id = ? AND organisation_id = (SELECT id FROM organisations WHERE slug = 'merrowdale')`, [personId("ewan")]);
  const { page } = await signIn(browser, "ewan@demo.invalid");
  await page.goto("/o/merrowdale/ready");
  const sheet = { apprenticeId: personId("ewan"), taskId: taskId("service-inspection"), vehicle: "DEMO 004", jobCardNumber: "X-1", idempotencyKey: randomUUID() };
  const answer = await call(page, "POST", "/orgs/merrowdale/observations", sheet);
  expect(answer).toMatchObject({ status: 403, body: { detail: expect.stringContaining("own work") } });
  await db.destroy();
});

test("a link that has run out is told plainly", async ({ page }) => {
  const db = ownerDb();
  const token = randomBytes(32).toString("base64url");
  await db("invitations").insert({
    organisation_id: db("organisations").select("id").where({ slug: "vennick" }),
    name: "Too Late",
    email: "too-late@demo.invalid",
    roles: ["mentor"],
    token_hash: createHash("sha256").update(token).digest("hex"),
    created_at: "2026-01-01",
    expires_at: "2026-01-08",
  });
  await page.goto(`/join#${token}`);
  await expect(page.getByText("This link does not work any more")).toBeVisible();
  await db.destroy();
});

test("a broken file of steps is refused with its lines, and nothing is half taken in", async ({ browser }) => {
  const { page } = await signIn(browser, "sunniva@demo.invalid");
  await page.goto(`/o/vennick/recordings/${recordingId("auxiliary-belt")}/bench`);
  const before = await call(page, "GET", `/orgs/vennick/recordings/${recordingId("auxiliary-belt")}/marking`);
  const file = inFolder("broken.vtt");
  writeFileSync(file, "WEBVTT\n\n00:00:00.000 --> 00:00:10.000\nOne\n\n00:00:05.000 --> 00:00:20.000\nTwo\n");
  await page.getByRole("button", { name: "WebVTT files" }).click();
  await page.getByLabel("Steps (chapters, .vtt)").setInputFiles(file);
  await page.getByRole("button", { name: "Take these files" }).click();
  await expect(page.getByText(/line 6/)).toBeVisible();
  expect(await call(page, "GET", `/orgs/vennick/recordings/${recordingId("auxiliary-belt")}/marking`)).toEqual(before);
});

test("a text file that is called .mp4 ends as a failed recording with its reason", async ({ browser }) => {
  const { page } = await signIn(browser, "sunniva@demo.invalid");
  const name = `not a film ${Date.now() % 100_000}`;
  writeFileSync(inFolder(`${name}.mp4`), "This is a text, whatever it is called.\n".repeat(200));
  await page.goto("/o/vennick/recordings");
  await page.getByLabel("Film to add").setInputFiles(inFolder(`${name}.mp4`));
  await page.getByRole("link", { name }).first().click({ timeout: 40_000 });
  await expect(page.getByText(/not a film|no film|can.t be read|not a video/i).first()).toBeVisible({ timeout: 40_000 });
  await expect(page.getByRole("button", { name: /again/i })).toBeVisible();
});

test("a picture that would burst on decoding is refused as evidence", async ({ browser }) => {
  const { page } = await signIn(browser, "asha@demo.invalid", PHONE);
  // RFC 2083: a signature, then IHDR with width and height; fifty thousand points each way.
  const header = Buffer.from("89504e470d0a1a0a0000000d494844520000c3500000c3500806000000", "hex");
  writeFileSync(inFolder("bomb.png"), Buffer.concat([header, Buffer.alloc(200)]));
  await page.goto(`/o/vennick/practice/${taskId("battery-drain")}`);
  const photos = page.getByRole("img", { name: /of your work/ });
  const before = await photos.count();
  await page.getByLabel("Photo of your work", { exact: true }).setInputFiles(inFolder("bomb.png"));
  await expect(page.getByText(/50000 × 50000/)).toBeVisible({ timeout: 30_000 });
  expect(await photos.count()).toBe(before);
});

test("a sheet that two tabs sign at once is signed once", async ({ browser }) => {
  const db = ownerDb();
  const { page } = await signIn(browser, "idris@demo.invalid");
  await page.goto("/o/merrowdale/ready");
  const started = await call(page, "POST", "/orgs/merrowdale/observations", {
    apprenticeId: personId("tomasz"),
    taskId: taskId("battery-drain"),
    vehicle: "DEMO 003",
    jobCardNumber: "X-2",
    idempotencyKey: randomUUID(),
  });
  const id = String(started.body.observationId);
  await call(page, "POST", `/orgs/merrowdale/observations/${id}/stop`, { reason: "Support not safe" });
  const before = await db("ledger_entries").count("* as n").first();
  const sign = () => call(page, "POST", `/orgs/merrowdale/observations/${id}/sign-off`, { password: "witness-line-demo-2026", level: null, feedback: "" });
  const answers = await Promise.all([sign(), sign()]);
  expect(answers.map(({ status }) => status).toSorted()).toEqual([200, 409]);
  expect(await db("sign_offs").where({ observation_id: id })).toHaveLength(1);
  const after = await db("ledger_entries").count("* as n").first();
  expect(Number(after?.n)).toBe(Number(before?.n) + 1);
  const wrong = await call(page, "POST", `/orgs/merrowdale/observations/${id}/sign-off`, { password: "not the password at all", level: null, feedback: "" });
  expect(wrong.status).toBe(403);
  await db.destroy();
});

test("an answer that two tabs send is marked once", async ({ browser }) => {
  const db = ownerDb();
  const { page } = await signIn(browser, "joss@demo.invalid", PHONE);
  await page.goto("/o/vennick/learn");
  const assignment = await db("assignments").where({ apprentice_id: personId("joss") }).whereNull("withdrawn_at").first();
  const revision = await db("module_revisions").where({ id: assignment.module_revision_id }).first();
  const question = revision.content.questions.find((candidate: { body: { kind: string } }) => candidate.body.kind === "one_of");
  const path = `/orgs/vennick/assignments/${assignment.id}`;
  const asked = await call(page, "POST", `${path}/attempts`, { questionId: question.id });
  const choices = (asked.body.ask as { choices: { id: string }[] }).choices;
  const send = (choiceId: string | undefined) => call(page, "POST", `${path}/answers`, { attemptId: asked.body.attemptId, given: { kind: "one_of", choiceId } });
  const answers = await Promise.all([send(choices[0]?.id), send(choices[1]?.id)]);
  expect(answers.map(({ status }) => status)).toEqual([200, 200]);
  expect(answers[0]?.body.right, "the second sending gets the first one's mark").toBe(answers[1]?.body.right);
  expect(await db("answers").where({ attempt_id: asked.body.attemptId })).toHaveLength(1);
  // Ids belong to one asking: those of the last are worth nothing in the next.
  const again = await call(page, "POST", `${path}/attempts`, { questionId: question.id });
  const stale = await call(page, "POST", `${path}/answers`, { attemptId: again.body.attemptId, given: { kind: "one_of", choiceId: choices[0]?.id } });
  expect(stale.status).toBe(400);
  await db.destroy();
});
