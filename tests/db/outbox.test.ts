import { expect, test } from "vitest";
import { addLetter, lockUnsentLetter, markLetterSent } from "@/db/queries/mail-outbox";
import { newToken } from "@/lib/services/accounts/single-use-link";
import { testDatabase } from "../support/database";

const { db } = testDatabase();

test("a letter keeps its link's token until it has left, and no longer", async () => {
  const { token } = newToken();
  const letter = { to: "a@people.test", subject: "S", paragraphs: [`Here:\nhttp://app.test/join#${token}`, "Bay #3 is free."] };
  const id = (await db().transaction((trx) => addLetter(trx, letter))) ?? "";
  await db().transaction(async (trx) => {
    expect((await lockUnsentLetter(trx, id))?.body).toContain(`#${token}\n`);
    await markLetterSent(trx, id);
  });
  const row = await db()("mail_outbox").where({ id }).first("body", "sent_at");
  expect(row.sent_at).toBeInstanceOf(Date);
  expect(row.body).toContain("http://app.test/join#…\n\nBay #3 is free.");
  expect(row.body).not.toContain(token);
});
