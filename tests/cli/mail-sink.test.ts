import { mkdtempSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { createTransport } from "nodemailer";
import { afterAll, beforeAll, expect, test } from "vitest";
import { LetterBox } from "@/lib/cli/mail-sink/letters";
import { startMailSink, type MailSink } from "@/lib/cli/mail-sink/server";

const folder = mkdtempSync(join(tmpdir(), "mail-"));
let sink: MailSink;
beforeAll(async () => {
  sink = await startMailSink({ folder, smtpPort: 0, port: 0 });
  const smtp = createTransport(sink.smtpUrl);
  await smtp.sendMail({ from: "Witnessline <no-reply@demo.invalid>", to: "asha@demo.invalid", subject: "Grüße & <b>more</b>", text: "Open https://app.test/join?a=1&b=2 today.\n<script>alert(1)</script>" });
  await smtp.sendMail({ from: "no-reply@demo.invalid", to: "Idris <idris@demo.invalid>", bcc: "calum@demo.invalid", subject: "Ready", text: "Asha is ready." });
});
afterAll(() => sink.close());

const get = async (path: string) => (await fetch(new URL(path, sink.url))).text();

test("what was sent over SMTP is listed as JSON, newest first, also by address", async () => {
  const all = JSON.parse(await get("/messages.json")) as { subject: string; to: string[]; from: string }[];
  expect(all.map(({ subject }) => subject)).toEqual(["Ready", "Grüße & <b>more</b>"]);
  expect(all[0]?.to).toEqual(["idris@demo.invalid", "calum@demo.invalid"]); // the envelope's, where a blind copy shows
  expect(all[1]?.from).toBe("no-reply@demo.invalid");
  expect(JSON.parse(await get("/messages.json?to=ASHA@demo.invalid"))).toHaveLength(1);
});

test("a letter is shown as text: nothing in it becomes markup, and its links can be followed", async () => {
  expect(await get("/")).toContain("Grüße &amp; &lt;b&gt;more&lt;/b&gt;");
  const [letter] = JSON.parse(await get("/messages.json?to=asha@demo.invalid")) as [{ id: string }];
  const page = await get(`/messages/${letter.id}`);
  expect(page).toContain("&lt;script&gt;alert(1)&lt;/script&gt;");
  expect(page).not.toContain("<script>");
  expect(page).toContain('<a href="https://app.test/join?a=1&amp;b=2" rel="noreferrer">');
  expect(await get(`/messages/${letter.id}.eml`)).toMatch(/^From: Witnessline <no-reply@demo\.invalid>/m);
});

test("an unknown letter is not found, and a path can't lead out of the folder", async () => {
  expect((await fetch(new URL("/messages/nothing", sink.url))).status).toBe(404);
  expect((await fetch(`${sink.url}/messages/..%2f..%2fetc%2fpasswd`)).status).toBe(404);
});

test("letters are still there for a later start", () => {
  expect(new LetterBox(folder).list().map(({ subject }) => subject)).toEqual(["Ready", "Grüße & <b>more</b>"]);
});
