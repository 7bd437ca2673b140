import { spawn } from "node:child_process";
import { readdir, readFile } from "node:fs/promises";
import { tmpdir } from "node:os";
import { expect, test, vi } from "vitest";
import { claimNextStage, failStage, finishStage, lockRecording, renewLease } from "@/db/queries/recording-stages";
import { openWorkspace } from "@/lib/jobs/media/workspace";
import { processRecording, takeUpForsaken } from "@/lib/jobs/process-recording";
import { viewRecording } from "@/lib/services/recordings/view-recording";
import { testClips } from "../support/clips";
import { testDatabase } from "../support/database";
import { createMember, createOrganisation } from "../support/factories";
import { testStore } from "../support/store";
import { bringIn } from "../support/uploads";

// A converter and a second process at work: give a busy machine time.
vi.setConfig({ testTimeout: 90_000 });

const { db } = testDatabase();
const store = testStore();
const clips = testClips();

async function someRecording(bytes: Buffer) {
  const mentor = await createMember(await createOrganisation(), "mentor");
  const { recordingId } = await bringIn(mentor, bytes);
  if (!recordingId) throw new Error("no recording");
  // As if a worker had fetched the job from the queue.
  await db().raw(`DELETE FROM pgboss.job WHERE name = 'process-recording'`);
  return { recordingId, see: () => viewRecording(mentor, recordingId) };
}
const small = () => clips.film("small.mp4", { size: "320x180", seconds: 1 });
const claim = (recordingId: string) => db().transaction((trx) => claimNextStage(trx, recordingId));
const endLeases = (recordingId: string) =>
  db()("recording_stages").where({ recording_id: recordingId, state: "running" }).update({ lease_until: db().raw("now() - interval '1 second'") });

test("of many workers at once one holds a stage", async () => {
  const { recordingId, see } = await someRecording(await small());
  const claims = await Promise.all(Array.from({ length: 6 }, () => claim(recordingId)));
  expect(claims.filter(Boolean)).toEqual([{ recordingId, stage: "probe", attempt: 1 }]);
  await endLeases(recordingId);
  await Promise.all([1, 2, 3].map(() => processRecording({ recordingId })));
  expect(await see()).toMatchObject({ state: "ready" });
  const attempts = await db()("recording_stages").where({ recording_id: recordingId }).pluck("attempt");
  expect(attempts.toSorted()).toEqual([1, 1, 1, 1, 2]);
});

test("while its holder lives a stage is left alone; after its lease another takes it, and the first can write nothing more", async () => {
  const { recordingId, see } = await someRecording(await small());
  const first = await claim(recordingId);
  if (!first) throw new Error("nothing to claim");
  expect(await renewLease(db(), first, 40)).toBe(true);
  await processRecording({ recordingId });
  expect((await see()).stages[0]).toMatchObject({ state: "running", percent: 40 });
  expect(await takeUpForsaken()).toEqual([]);

  await endLeases(recordingId);
  expect(await takeUpForsaken()).toEqual([recordingId]);
  expect(await takeUpForsaken()).toEqual([]);
  const second = await claim(recordingId);
  expect(second).toEqual({ ...first, attempt: 2 });
  expect(await renewLease(db(), first, 90)).toBe(false);
  await db().transaction(async (trx) => {
    await lockRecording(trx, recordingId);
    expect(await finishStage(trx, first)).toBe(false);
    expect(await failStage(trx, first, "late")).toBe(false);
  });
  expect(await see()).toMatchObject({ state: "processing", stages: [{ state: "running" }, {}, {}, {}, {}] });
});

test("a worker killed in the middle of a film is followed by another, and its converter dies with it", async () => {
  const { recordingId, see } = await someRecording(await clips.film("longer.mp4", { size: "1280x720", seconds: 25, args: ["-g", "250"] }));
  const worker = spawn(process.execPath, ["--import", "tsx", "tests/support/process-recording.ts", recordingId], { stdio: "ignore" });
  await expect.poll(async () => (await see()).stages[1]?.percent, { timeout: 45_000, interval: 50 }).toBeGreaterThan(0);
  worker.kill("SIGKILL");
  await new Promise((resolve) => worker.once("close", resolve));
  expect(await see()).toMatchObject({ state: "processing", stages: [{ state: "done" }, { state: "running" }, {}, {}, {}] });
  await expect.poll(() => convertersOf(recordingId), { timeout: 2000 }).toEqual([]);

  await endLeases(recordingId);
  expect(await takeUpForsaken()).toEqual([recordingId]);
  const next = await claim(recordingId);
  expect(next).toMatchObject({ stage: "480p", attempt: 2 });
  // What the dead worker left on the disk goes when the next one begins.
  const foldersOf = async () => (await readdir(tmpdir())).filter((name) => name.includes(recordingId));
  expect(await foldersOf()).toHaveLength(1);
  const [left] = await foldersOf();
  const workspace = await openWorkspace(recordingId);
  expect(await foldersOf()).not.toContain(left);
  await workspace.remove();
  expect(await foldersOf()).toEqual([]);
});

test("a stage over which workers keep dying waits for a person", async () => {
  const { recordingId, see } = await someRecording(await small());
  for (let count = 0; count < 4; count++) {
    expect(await claim(recordingId)).toBeDefined();
    await endLeases(recordingId);
  }
  await processRecording({ recordingId });
  expect(await see()).toMatchObject({ state: "failed", failure: "Looking at the film was tried 4 times and broke off each time." });
});

// Last: the store stays away.
test("while the store is out of reach the recording waits, and no attempt counts", async () => {
  const { recordingId, see } = await someRecording(await small());
  await store.stop();
  await expect(processRecording({ recordingId })).rejects.toMatchObject({ code: "unavailable" });
  expect((await see()).stages[0]).toMatchObject({ state: "waiting" });
  expect(await db()("recording_stages").where({ recording_id: recordingId }).pluck("attempt")).toEqual([0, 0, 0, 0, 0]);
  expect(await takeUpForsaken()).toContain(recordingId);
});

/** Process ids of converters at work on this recording: its id is in the path of the file they read. */
async function convertersOf(recordingId: string): Promise<string[]> {
  const found: string[] = [];
  for (const pid of (await readdir("/proc")).filter((name) => /^\d+$/.test(name))) {
    const line = await readFile(`/proc/${pid}/cmdline`, "utf8").catch(() => "");
    if (line.includes(recordingId) && line.includes("ffmpeg")) found.push(pid);
  }
  return found;
}
