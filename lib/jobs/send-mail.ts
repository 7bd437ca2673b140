import { createTransport, type Transporter } from "nodemailer";
import { z } from "zod";
import { getDb } from "@/db/client";
import { lockUnsentLetter, markLetterSent, noteLetterFailure } from "@/db/queries/mail-outbox";
import { env } from "@/lib/env";

export const sendMailPayload = z.object({ letterId: z.uuid() });

let transport: Transporter | undefined;

/**
 * Sends one letter. Safe to run twice: the row is locked while it is sent and a sent letter is left alone. Should the worker die
 * between handing over and noting it, the letter goes out again with the same Message-ID.
 */
export async function sendMail(data: unknown): Promise<void> {
  const { letterId } = sendMailPayload.parse(data);
  transport ??= createTransport(env().SMTP_URL);
  const smtp = transport;
  try {
    await getDb().transaction(async (trx) => {
      const letter = await lockUnsentLetter(trx, letterId);
      if (!letter) return;
      await smtp.sendMail({
        from: env().MAIL_FROM,
        to: letter.to,
        subject: letter.subject,
        text: letter.body,
        messageId: `<${letter.id}@${new URL(env().APP_URL).hostname}>`,
      });
      await markLetterSent(trx, letter.id);
    });
  } catch (error) {
    await noteLetterFailure(getDb(), letterId, error instanceof Error ? error.message : String(error));
    throw error;
  }
}
