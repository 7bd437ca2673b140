import { getDb } from "@/db/client";

/** What the outbox holds for an address, the newest first. */
export async function lettersTo(email: string): Promise<{ subject: string; body: string }[]> {
  return getDb()("mail_outbox").select("subject", "body").where({ to_address: email }).orderBy("id", "desc");
}

/** The token of the single-use link in the newest letter to an address. */
export async function tokenSentTo(email: string): Promise<string> {
  const body = (await lettersTo(email)).map((letter) => letter.body).find((text) => text.includes("#"));
  const token = body?.match(/#([\w-]+)/)?.[1];
  if (!token) throw new Error(`No letter with a link went to ${email}.`);
  return token;
}
