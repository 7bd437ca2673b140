import type { Knex } from "knex";
import type { Db } from "@/db/client";

export type UploadPurpose = "recording" | "evidence";

export type Upload = {
  id: string;
  organisationId: string;
  personId: string;
  purpose: UploadPurpose;
  fileName: string;
  mediaType: string;
  sizeBytes: number;
  modifiedMs: number;
  storeKey: string;
  storeUploadId: string;
  partSizeBytes: number;
  state: "open" | "completed" | "aborted";
  createdAt: Date;
};

const COLUMNS = [
  "id", "organisation_id", "person_id", "purpose", "file_name", "media_type", "size_bytes", "modified_ms", "store_key", "store_upload_id",
  "part_size_bytes", "state", "created_at",
] as const;

type Row = Record<(typeof COLUMNS)[number], never>;

const toUpload = (row: Row): Upload => ({
  id: row.id,
  organisationId: row.organisation_id,
  personId: row.person_id,
  purpose: row.purpose,
  fileName: row.file_name,
  mediaType: row.media_type,
  sizeBytes: row.size_bytes,
  modifiedMs: row.modified_ms,
  storeKey: row.store_key,
  storeUploadId: row.store_upload_id,
  partSizeBytes: row.part_size_bytes,
  state: row.state,
  createdAt: row.created_at,
});

/** A new id that sorts by time, made before the row is, since the object's key is made of it. */
export async function newUploadId(db: Db): Promise<string> {
  const { rows } = await db.raw(`SELECT uuid_v7() AS id`);
  return rows[0].id;
}

/** Which file it is, as far as a browser tells: the one that is picked again after a reload. */
export type FileMark = { organisationId: string; personId: string; purpose: UploadPurpose; fileName: string; sizeBytes: number; modifiedMs: number };

const whereMarked = (db: Db, mark: FileMark) =>
  db("uploads").where({
    organisation_id: mark.organisationId,
    person_id: mark.personId,
    purpose: mark.purpose,
    file_name: mark.fileName,
    size_bytes: mark.sizeBytes,
    modified_ms: mark.modifiedMs,
    state: "open",
  });

/** The person's open upload of that very file, if there is one. */
export async function findOpenUploadOf(db: Db, mark: FileMark): Promise<Upload | undefined> {
  const row = await whereMarked(db, mark).select<Row[]>(...COLUMNS).orderBy("created_at").first();
  return row && toUpload(row as Row);
}

/** One person's starts one after the other until the transaction ends, so that two tabs with the same file share one upload. */
export async function lockUploadsOf(trx: Knex.Transaction, personId: string): Promise<void> {
  await trx.raw(`SELECT pg_advisory_xact_lock(hashtextextended('uploads of ' || ?, 0))`, [personId]);
}

export async function insertUpload(trx: Knex.Transaction, upload: Omit<Upload, "state" | "createdAt">): Promise<Upload> {
  const [row] = await trx("uploads")
    .insert({
      id: upload.id,
      organisation_id: upload.organisationId,
      person_id: upload.personId,
      purpose: upload.purpose,
      file_name: upload.fileName,
      media_type: upload.mediaType,
      size_bytes: upload.sizeBytes,
      modified_ms: upload.modifiedMs,
      store_key: upload.storeKey,
      store_upload_id: upload.storeUploadId,
      part_size_bytes: upload.partSizeBytes,
    })
    .returning<Row[]>([...COLUMNS]);
  if (!row) throw new Error("The upload's row was not written.");
  return toUpload(row);
}

/** The person's own uploads that are still open, newest first. */
export async function listOpenUploads(db: Db, of: { organisationId: string; personId: string }): Promise<Upload[]> {
  const rows = await db("uploads")
    .select<Row[]>(...COLUMNS)
    .where({ organisation_id: of.organisationId, person_id: of.personId, state: "open" })
    .orderBy("created_at", "desc");
  return rows.map(toUpload);
}

export async function findUpload(db: Db, organisationId: string, id: string): Promise<Upload | undefined> {
  const row = await db("uploads").select<Row[]>(...COLUMNS).where({ organisation_id: organisationId, id }).first();
  return row && toUpload(row as Row);
}

/** Locks the upload, so that of two completions, or a completion and a cancelling, one comes after the other. */
export async function findUploadForUpdate(trx: Knex.Transaction, organisationId: string, id: string): Promise<Upload | undefined> {
  const row = await trx("uploads").select<Row[]>(...COLUMNS).where({ organisation_id: organisationId, id }).forUpdate().first();
  return row && toUpload(row as Row);
}

export async function endUpload(trx: Knex.Transaction, id: string, state: "completed" | "aborted"): Promise<void> {
  await trx("uploads").where({ id }).update({ state, ended_at: trx.fn.now() });
}
