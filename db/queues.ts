import PgBoss from "pg-boss";

/** Every queue by name. A job's payload is checked by its own file in lib/jobs. */
export const QUEUES = {
  "process-recording": { retryLimit: 2, retryDelay: 5, expireInSeconds: 4 * 3600 },
  "send-mail": { retryLimit: 8, retryBackoff: true, retryDelay: 5, expireInSeconds: 120 },
} as const;

export type QueueName = keyof typeof QUEUES;

/** Makes the queue's own tables and one partition per queue, which takes DDL: only the migration role may. */
export async function createQueues(ownerUrl: string): Promise<void> {
  const boss = new PgBoss({ connectionString: ownerUrl, max: 2, supervise: false, schedule: false });
  await boss.start();
  try {
    for (const [name, options] of Object.entries(QUEUES)) {
      await boss.createQueue(name, { name, ...options });
      await boss.updateQueue(name, { name, ...options });
    }
  } finally {
    await boss.stop({ graceful: false });
  }
}
