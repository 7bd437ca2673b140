import { expect, test } from "vitest";
import { ROLES, type Role } from "@/lib/core/roles";
import { env } from "@/lib/env";
import { cancelUpload } from "@/lib/services/uploads/cancel-upload";
import { completeUpload } from "@/lib/services/uploads/complete-upload";
import { signParts } from "@/lib/services/uploads/sign-parts";
import { startUpload } from "@/lib/services/uploads/start-upload";
import { viewOpenUploads } from "@/lib/services/uploads/view-open-uploads";
import { viewUpload } from "@/lib/services/uploads/view-upload";
import { getStore } from "@/storage/store";
import { testDatabase } from "../../support/database";
import { createMember, createOrganisation } from "../../support/factories";
import { testStore } from "../../support/store";
import { bringIn, sendParts, someFile } from "../../support/uploads";

const { db } = testDatabase();
testStore();

const MIB = 1024 * 1024;
const bytesOf = (size: number) => Buffer.alloc(size, "film");
const jobsFor = async (recordingId: string) =>
  (await db().raw(`SELECT count(*) AS n FROM pgboss.job WHERE name = 'process-recording' AND data ->> 'recordingId' = ?`, [recordingId])).rows[0].n;

test("a recording comes in by parts straight to the store, and is put in the queue once it is whole", async () => {
  const mentor = await createMember(await createOrganisation(), "mentor");
  const bytes = bytesOf(17 * MIB);
  const upload = await startUpload(mentor, someFile(bytes.length, { fileName: "Front brake pads, near side.MOV" }));
  expect(upload).toMatchObject({ state: "open", partSizeBytes: 8 * MIB, receivedParts: [] });
  expect(await sendParts(mentor, upload, bytes, [3, 1])).toEqual([200, 200]);

  await expect(completeUpload(mentor, upload.uploadId)).rejects.toMatchObject({ code: "conflict" });
  expect(await db()("recordings").where({ id: upload.uploadId })).toEqual([]);
  expect(await viewUpload(mentor, upload.uploadId)).toMatchObject({ receivedParts: [1, 3], receivedBytes: 9 * MIB });

  expect(await sendParts(mentor, upload, bytes, [2])).toEqual([200]);
  const { recordingId, fileId } = await completeUpload(mentor, upload.uploadId);
  const recording = await db()("recordings").where({ id: recordingId }).first();
  expect(recording).toMatchObject({ title: "Front brake pads, near side", state: "processing", recorded_by: mentor.personId, source_file_id: fileId });
  const file = await db()("files").where({ id: fileId }).first();
  expect(await getStore().headObject(file.store_key)).toMatchObject({ sizeBytes: bytes.length });
  expect((await db()("recording_stages").where({ recording_id: recordingId })).map(({ state }) => state)).toEqual(Array(5).fill("waiting"));
  expect(await jobsFor(recordingId ?? "")).toBe(1);
  expect(await viewOpenUploads(mentor)).toEqual([]);
});

test("the same file picked again goes on; another date of change is another file", async () => {
  const mentor = await createMember(await createOrganisation(), "mentor");
  const bytes = bytesOf(9 * MIB);
  const file = someFile(bytes.length);
  const first = await startUpload(mentor, file);
  await sendParts(mentor, first, bytes, [1]);
  expect(await startUpload(mentor, file)).toMatchObject({ uploadId: first.uploadId, receivedParts: [1], receivedBytes: 8 * MIB });
  expect((await startUpload(mentor, { ...file, modifiedMs: file.modifiedMs + 1 })).uploadId).not.toBe(first.uploadId);
  const colleague = await createMember(mentor.organisation, "mentor");
  expect((await startUpload(colleague, file)).uploadId).not.toBe(first.uploadId);
});

test("a file whose parts the store has dropped is begun anew", async () => {
  const mentor = await createMember(await createOrganisation(), "mentor");
  const file = someFile(100);
  const first = await startUpload(mentor, file);
  const row = await db()("uploads").where({ id: first.uploadId }).first();
  await getStore().abortMultipart(row.store_key, row.store_upload_id);
  const second = await startUpload(mentor, file);
  expect(second).toMatchObject({ state: "open", receivedParts: [] });
  expect(second.uploadId).not.toBe(first.uploadId);
});

test("two tabs that start with one file at once share one upload, and nothing is left open in the store", async () => {
  const mentor = await createMember(await createOrganisation(), "mentor");
  const file = someFile(100);
  const started = await Promise.all([1, 2, 3, 4].map(() => startUpload(mentor, file)));
  expect(new Set(started.map(({ uploadId }) => uploadId)).size).toBe(1);
  expect(await viewOpenUploads(mentor)).toHaveLength(1);
});

test("completed twice at once, it is one recording and one job", async () => {
  const mentor = await createMember(await createOrganisation(), "mentor");
  const upload = await startUpload(mentor, someFile(1000));
  await sendParts(mentor, upload, bytesOf(1000));
  const outcomes = await Promise.all([1, 2, 3].map(() => completeUpload(mentor, upload.uploadId)));
  expect(new Set(outcomes.map((outcome) => JSON.stringify(outcome))).size).toBe(1);
  expect(await completeUpload(mentor, upload.uploadId)).toEqual(outcomes[0]);
  expect(await db()("recordings").where({ upload_id: upload.uploadId })).toHaveLength(1);
  expect(await jobsFor(upload.uploadId)).toBe(1);
});

test("the store takes no part of another size than was said, and completion refuses a sum that differs", async () => {
  const mentor = await createMember(await createOrganisation(), "mentor");
  const upload = await startUpload(mentor, someFile(1000));
  const [status] = await sendParts(mentor, { ...upload, partSizeBytes: 900 }, bytesOf(1000), [1]);
  expect(status).toBe(403);
  // Whoever holds the store's own key could still send something else: the sum is held against what was said.
  const row = await db()("uploads").where({ id: upload.uploadId }).first();
  const url = await getStore().presignPart(row.store_key, row.store_upload_id, 1, 60);
  expect((await fetch(url, { method: "PUT", body: "short" })).status).toBe(200);
  await expect(completeUpload(mentor, upload.uploadId)).rejects.toMatchObject({ code: "conflict", message: "5 of 1000 bytes of the file have arrived." });
});

test("an upload given up is gone, with what had arrived", async () => {
  const mentor = await createMember(await createOrganisation(), "mentor");
  const upload = await startUpload(mentor, someFile(1000));
  await sendParts(mentor, upload, bytesOf(1000));
  await cancelUpload(mentor, upload.uploadId);
  await cancelUpload(mentor, upload.uploadId);
  await expect(completeUpload(mentor, upload.uploadId)).rejects.toMatchObject({ code: "gone" });
  await expect(signParts(mentor, upload.uploadId, [1])).rejects.toMatchObject({ code: "gone" });
  expect(await viewUpload(mentor, upload.uploadId)).toMatchObject({ state: "aborted", receivedParts: [] });
  const row = await db()("uploads").where({ id: upload.uploadId }).first();
  await expect(getStore().listParts(row.store_key, row.store_upload_id)).rejects.toMatchObject({ code: "gone" });
});

test("given up and completed at once, it is one or the other", async () => {
  const mentor = await createMember(await createOrganisation(), "mentor");
  for (let round = 0; round < 5; round++) {
    const upload = await startUpload(mentor, someFile(500));
    await sendParts(mentor, upload, bytesOf(500));
    const [completed, cancelled] = await Promise.allSettled([completeUpload(mentor, upload.uploadId), cancelUpload(mentor, upload.uploadId)]);
    const recordings = await db()("recordings").where({ id: upload.uploadId });
    const row = await db()("uploads").where({ id: upload.uploadId }).first();
    expect(recordings).toHaveLength(completed.status === "fulfilled" ? 1 : 0);
    expect(cancelled.status).toBe(completed.status === "fulfilled" ? "rejected" : "fulfilled");
    expect((await getStore().headObject(row.store_key))?.sizeBytes).toBe(completed.status === "fulfilled" ? 500 : undefined);
  }
});

test("evidence becomes a file and no recording", async () => {
  const apprentice = await createMember(await createOrganisation(), "apprentice");
  const outcome = await bringIn(apprentice, bytesOf(2000), { purpose: "evidence", fileName: "pads.jpg", mediaType: "image/jpeg" });
  expect(outcome.recordingId).toBeNull();
  expect(await db()("files").where({ id: outcome.fileId }).first()).toMatchObject({ size_bytes: 2000, created_by: apprentice.personId });
  expect(await db()("recordings").where({ id: outcome.fileId })).toEqual([]);
});

test.each(ROLES.filter((role) => role !== "mentor"))("a %s adds no recording", async (role: Role) => {
  const actor = await createMember(await createOrganisation(["liaison", "verifier"].includes(role) ? "college" : "workshop"), role);
  await expect(startUpload(actor, someFile(10))).rejects.toMatchObject({ code: "forbidden" });
});

test.each(ROLES.filter((role) => role !== "apprentice"))("a %s adds no evidence", async (role: Role) => {
  const actor = await createMember(await createOrganisation(["liaison", "verifier"].includes(role) ? "college" : "workshop"), role);
  await expect(startUpload(actor, someFile(10, { purpose: "evidence" }))).rejects.toMatchObject({ code: "forbidden" });
});

test("an upload is its own person's alone, and its organisation's", async () => {
  const mentor = await createMember(await createOrganisation(), "mentor");
  const { uploadId } = await startUpload(mentor, someFile(10));
  const colleague = await createMember(mentor.organisation, "mentor");
  const elsewhere = { ...mentor, organisation: await createOrganisation() };
  for (const stranger of [colleague, elsewhere]) {
    const absent = { code: "not_found" };
    await expect(viewUpload(stranger, uploadId)).rejects.toMatchObject(absent);
    await expect(signParts(stranger, uploadId, [1])).rejects.toMatchObject(absent);
    await expect(completeUpload(stranger, uploadId)).rejects.toMatchObject(absent);
    await expect(cancelUpload(stranger, uploadId)).rejects.toMatchObject(absent);
    expect(await viewOpenUploads(stranger)).toEqual([]);
  }
});

test("what is too large is refused before a byte is sent, and so is a part that the file doesn't have", async () => {
  const workshop = await createOrganisation();
  const [mentor, apprentice] = [await createMember(workshop, "mentor"), await createMember(workshop, "apprentice")];
  await expect(startUpload(mentor, someFile(env().UPLOAD_LIMIT_BYTES + 1))).rejects.toMatchObject({ code: "too_large" });
  await expect(startUpload(apprentice, someFile(41 * MIB, { purpose: "evidence" }))).rejects.toMatchObject({ code: "too_large" });
  const largest = await startUpload(mentor, someFile(env().UPLOAD_LIMIT_BYTES));
  expect(Math.ceil(largest.sizeBytes / largest.partSizeBytes)).toBeLessThanOrEqual(1000);
  const { uploadId } = await startUpload(mentor, someFile(9 * MIB));
  await expect(signParts(mentor, uploadId, [1, 3])).rejects.toMatchObject({ code: "invalid_input" });
});

test("nobody fills the store with beginnings", async () => {
  const mentor = await createMember(await createOrganisation(), "mentor");
  for (let count = 0; count < 20; count++) await startUpload(mentor, someFile(10));
  await expect(startUpload(mentor, someFile(10))).rejects.toMatchObject({ code: "too_many" });
});
