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
  return rows[0].count <= window.limit;
}
