import type { Db } from "@/db/client";

/** Kinds of licence that a person holds on `day`. */
export async function listLicencesHeld(db: Db, personId: string, day: string): Promise<string[]> {
  const rows = await db("licences").distinct("kind").where({ person_id: personId }).where("valid_from", "<=", day).where("valid_until", ">=", day);
  return rows.map((row) => row.kind);
}
