import type { Knex } from "knex";

export type NewFile = { organisationId: string; storeKey: string; mediaType: string; sizeBytes: number; createdBy: string | null };

/** Notes an object of the store as a file. `id` is given where another row already counts on it. */
export async function insertFile(trx: Knex.Transaction, file: NewFile & { id?: string }): Promise<string> {
  const [row] = await trx("files")
    .insert({
      ...(file.id ? { id: file.id } : {}),
      organisation_id: file.organisationId,
      store_key: file.storeKey,
      media_type: file.mediaType,
      size_bytes: file.sizeBytes,
      created_by: file.createdBy,
    })
    .returning<{ id: string }[]>("id");
  if (!row) throw new Error("The file's row was not written.");
  return row.id;
}

/** Notes an object that may be written again under the same key, as a job that runs twice does. Returns the file's id, old or new. */
export async function putFile(trx: Knex.Transaction, file: NewFile): Promise<string> {
  const [row] = await trx("files")
    .insert({
      organisation_id: file.organisationId,
      store_key: file.storeKey,
      media_type: file.mediaType,
      size_bytes: file.sizeBytes,
      created_by: file.createdBy,
    })
    .onConflict("store_key")
    .merge(["media_type", "size_bytes"])
    .returning<{ id: string }[]>("id");
  if (!row) throw new Error("The file's row was not written.");
  return row.id;
}
