import { startMailSink } from "@/lib/cli/mail-sink/server";

// The mail sink as a process of its own; its three settings come from the command that starts it.
async function main(): Promise<void> {
  const { MAIL_SINK_DIR: folder, MAIL_SINK_SMTP_PORT: smtpPort, MAIL_SINK_PORT: port } = process.env;
  if (!folder || !smtpPort || !port) throw new Error("MAIL_SINK_DIR, MAIL_SINK_SMTP_PORT and MAIL_SINK_PORT must be set.");
  const sink = await startMailSink({ folder, smtpPort: Number(smtpPort), port: Number(port) });
  console.log(`Mail is taken at ${sink.smtpUrl} and shown at ${sink.url}`);
  const stop = () => void sink.close().then(() => process.exit(0));
  process.once("SIGTERM", stop);
  process.once("SIGINT", stop);
}

main().catch((error: Error) => {
  console.error(`The mail sink can't start: ${error.message}`);
  process.exit(1);
});
