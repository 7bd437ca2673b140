import PgBoss from "pg-boss";
import { pino } from "pino";
import { getDb } from "@/db/client";
import type { QueueName } from "@/db/queues";
import { env } from "@/lib/env";
import { processRecording, takeUpForsaken } from "@/lib/jobs/process-recording";
import { sendMail } from "@/lib/jobs/send-mail";

const log = pino({ name: "worker" });

const SWEEP_EVERY_MS = 20_000;

/** What each queue does. A job is a function of its payload that is safe to run twice. */
const JOBS: Partial<Record<QueueName, (data: unknown) => Promise<void>>> = {
  "process-recording": processRecording,
  "send-mail": sendMail,
};

async function main(): Promise<void> {
  // The queue's tables are made by the migration role; this process may only use them.
  const boss = new PgBoss({ connectionString: env().DATABASE_URL, migrate: false, max: 4 });
  boss.on("error", (error) => log.error({ err: error }, "queue"));
  await boss.start();
  for (const [queue, run] of Object.entries(JOBS)) {
    await boss.work(queue, { batchSize: 1, pollingIntervalSeconds: 1 }, async ([job]) => {
      if (!job) return;
      log.info({ queue, job: job.id }, "begins");
      try {
        await run(job.data);
      } catch (error) {
        log.error({ err: error, queue, job: job.id }, "broke off");
        throw error;
      }
      log.info({ queue, job: job.id }, "done");
    });
  }
  await sweep();
  const sweeping = setInterval(sweep, SWEEP_EVERY_MS);
  log.info("ready");
  const stop = async () => {
    clearInterval(sweeping);
    await boss.stop({ graceful: true, timeout: 10_000 });
    await getDb().destroy();
    process.exit(0);
  };
  process.once("SIGTERM", stop);
  process.once("SIGINT", stop);
}

/** The queue gives a killed worker's job back only after hours; the leases tell within a minute. */
async function sweep(): Promise<void> {
  const taken = await takeUpForsaken().catch((error: unknown) => log.error({ err: error }, "sweep"));
  if (taken && taken.length > 0) log.info({ recordings: taken }, "taken up again");
}

main().catch((error: unknown) => {
  log.fatal({ err: error }, "the worker could not start");
  process.exit(1);
});
