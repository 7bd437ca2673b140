import type { Knex } from "knex";
import type { Db } from "@/db/client";
import type { OrganisationKind } from "@/lib/core/roles";

export type Organisation = { id: string; slug: string; name: string; kind: OrganisationKind };

export async function findOrganisation(db: Db, by: { id: string } | { slug: string }): Promise<Organisation | undefined> {
  return db("organisations").select("id", "slug", "name", "kind").where(by).first();
}

/** Founds an organisation; undefined where its short name is taken. */
export async function insertOrganisation(trx: Knex.Transaction, of: Omit<Organisation, "id">): Promise<Organisation | undefined> {
  const [row] = await trx("organisations")
    .insert(of)
    .onConflict("slug")
    .ignore()
    .returning<Organisation[]>(["id", "slug", "name", "kind"]);
  return row;
}
