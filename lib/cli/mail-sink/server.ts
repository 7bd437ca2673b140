import { readFileSync } from "node:fs";
import { createServer, type ServerResponse } from "node:http";
import { join } from "node:path";
import type { AddressInfo } from "node:net";
import { SMTPServer } from "smtp-server";
import { LetterBox } from "@/lib/cli/mail-sink/letters";
import { letterPage, listPage, missingPage, STYLE } from "@/lib/cli/mail-sink/pages";

const LARGEST_LETTER_BYTES = 5 * 1024 * 1024;

export type MailSink = { smtpUrl: string; url: string; close: () => Promise<void> };

/** Takes all mail on the loopback, keeps it in a folder and shows it on a page. Port 0 means any free one. */
export async function startMailSink(options: { folder: string; smtpPort: number; port: number }): Promise<MailSink> {
  const box = new LetterBox(options.folder);
  const smtp = new SMTPServer({
    authOptional: true,
    disabledCommands: ["STARTTLS", "AUTH"],
    size: LARGEST_LETTER_BYTES,
    onData(stream, session, done) {
      const chunks: Buffer[] = [];
      stream.on("data", (chunk: Buffer) => chunks.push(chunk));
      stream.on("end", () => {
        if (stream.sizeExceeded) return done(new Error("The letter is larger than 5 MB."));
        box.keep(Buffer.concat(chunks), session.envelope.rcptTo.map((to) => to.address)).then(() => done(), done);
      });
    },
  });
  const site = createServer((request, response) => {
    const url = new URL(request.url ?? "/", "http://sink");
    const id = /^\/messages\/([\w-]+)(\.eml)?$/.exec(url.pathname);
    const letter = id?.[1] ? box.find(id[1]) : undefined;
    if (url.pathname === "/") return send(response, 200, "text/html", listPage(box.list()));
    if (url.pathname === "/style.css") return send(response, 200, "text/css", STYLE);
    if (url.pathname === "/messages.json") return send(response, 200, "application/json", JSON.stringify(box.list(url.searchParams.get("to") ?? undefined)));
    if (!letter) return send(response, 404, "text/html", missingPage());
    if (id?.[2]) return send(response, 200, "text/plain", readFileSync(join(options.folder, `${letter.id}.eml`)));
    return send(response, 200, "text/html", letterPage(letter));
  });
  await new Promise<void>((resolve, reject) => smtp.once("error", reject).listen(options.smtpPort, "127.0.0.1", resolve));
  await new Promise<void>((resolve, reject) => site.once("error", reject).listen(options.port, "127.0.0.1", resolve));
  // A client that hangs up in the middle is no reason to end.
  smtp.on("error", (error) => console.error(`mail: ${error.message}`));
  return {
    smtpUrl: `smtp://127.0.0.1:${(smtp.server.address() as AddressInfo).port}`,
    url: `http://127.0.0.1:${(site.address() as AddressInfo).port}`,
    close: async () => {
      await new Promise<void>((resolve) => smtp.close(resolve));
      site.closeAllConnections();
      await new Promise((resolve) => site.close(resolve));
    },
  };
}

function send(response: ServerResponse, status: number, type: string, body: string | Buffer): void {
  response.writeHead(status, {
    "content-type": `${type}; charset=utf-8`,
    "content-security-policy": "default-src 'none'; style-src 'self'; frame-ancestors 'none'",
    "x-content-type-options": "nosniff",
    "referrer-policy": "no-referrer",
    "cache-control": "no-store",
  });
  response.end(body);
}
