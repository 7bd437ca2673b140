import type { Db } from "@/db/client";

/** Opens a session and returns its id. */
export async function startSession(db: Db, of: { personId: string; device: string; days: number }): Promise<string> {
  const [row] = await db("sessions")
    .insert({ person_id: of.personId, device: of.device, expires_at: db.raw("now() + make_interval(days => ?)", [of.days]) })
    .returning<{ id: string }[]>("id");
  if (!row) throw new Error("The session's row did not come back.");
  return row.id;
}

export async function endSession(db: Db, sessionId: string): Promise<void> {
  await db("sessions").where({ id: sessionId }).whereNull("ended_at").update({ ended_at: db.fn.now() });
}

/** Signs a person out everywhere; works at the next request of each device. Returns how many sessions ended. */
export async function endSessionsOf(db: Db, personId: string): Promise<number> {
  return db("sessions").where({ person_id: personId }).whereNull("ended_at").update({ ended_at: db.fn.now() });
}

export type OpenSession = { id: string; device: string; createdAt: Date; lastSeenAt: Date };

export async function listOpenSessions(db: Db, personId: string): Promise<OpenSession[]> {
  const rows = await db("sessions")
    .select("id", "device", "created_at", "last_seen_at")
    .where({ person_id: personId })
    .whereNull("ended_at")
    .where("expires_at", ">", db.fn.now())
    .orderBy("last_seen_at", "desc");
  return rows.map((row) => ({ id: row.id, device: row.device, createdAt: row.created_at, lastSeenAt: row.last_seen_at }));
}

/** Ends one of the person's own sessions. Returns whether it was theirs and open. */
export async function endSessionOf(db: Db, personId: string, sessionId: string): Promise<boolean> {
  const ended = await db("sessions").where({ id: sessionId, person_id: personId }).whereNull("ended_at").update({ ended_at: db.fn.now() });
  return ended > 0;
}

/** Signs the person out on every device but the one in hand. */
export async function endOtherSessionsOf(db: Db, personId: string, keepSessionId: string): Promise<number> {
  return db("sessions")
    .where({ person_id: personId })
    .whereNot({ id: keepSessionId })
    .whereNull("ended_at")
    .update({ ended_at: db.fn.now() });
}
