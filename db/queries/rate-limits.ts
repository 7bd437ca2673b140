import type { Db } from "@/db/client";

/**
 * Counts one try and says whether it is still within the limit. Shared by every instance, since it lives in the database.
 * @param key     what is limited, for example "sign-in:someone@example.org"
 * @param window  at most `limit` tries in each window of `windowSeconds`
 */
export async function countHit(db: Db, key: string, window: { limit: number; windowSeconds: number }): Promise<boolean> {
  const { rows } = await db.raw(
    `INSERT INTO rate_limits AS r (key, window_start)
     VALUES (:key, to_timestamp(floor(extract(epoch FROM now()) / :seconds) * :seconds))
     ON CONFLICT (key, window_start) DO UPDATE SET count = r.count + 1
     RETURNING count`,
    { key, seconds: window.windowSeconds },
  );
  // Keys are whatever was typed, so the table would grow for ever; now and then whoever begins a new row takes the old ones away.
  if (rows[0].count === 1 && Math.random() < 0.02) {
    await db("rate_limits").where("window_start", "<", db.raw("now() - interval '2 days'")).delete();
  }
  return rows[0].count <= window.limit;
}
