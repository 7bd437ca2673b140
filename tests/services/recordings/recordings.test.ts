import { randomUUID } from "node:crypto";
import { expect, test } from "vitest";
import { ROLES, type Actor, type Role } from "@/lib/core/roles";
import { changeRecording } from "@/lib/services/recordings/change-recording";
import { importCaptions } from "@/lib/services/recordings/import-captions";
import { prepareAgain } from "@/lib/services/recordings/prepare-again";
import { putAwayRecording } from "@/lib/services/recordings/put-away-recording";
import { viewRecording } from "@/lib/services/recordings/view-recording";
import { viewRecordingMedia } from "@/lib/services/recordings/view-recording-media";
import { viewRecordings } from "@/lib/services/recordings/view-recordings";
import { viewVehicles } from "@/lib/services/recordings/view-vehicles";
import { testDatabase } from "../../support/database";
import { createMember, createOrganisation } from "../../support/factories";

const { db } = testDatabase();

/** A recording's row as the worker leaves it, without a film behind it. */
async function createRecording(mentor: Actor, over: object = {}): Promise<string> {
  const organisation_id = mentor.organisation.id;
  const id = randomUUID();
  await db()("files").insert({ id, organisation_id, store_key: id, media_type: "video/mp4", size_bytes: 1000 });
  const row = { id, organisation_id, title: "Front brake pads", recorded_by: mentor.personId, source_file_id: id, state: "ready", duration_ms: 60_000 };
  await db()("recordings").insert({ ...row, ...over });
  return id;
}
const someMentor = async () => createMember(await createOrganisation(), "mentor");

const DOORS: [string, (actor: Actor, id: string) => Promise<unknown>][] = [
  ["sees one", viewRecording],
  ["plays one", viewRecordingMedia],
  ["changes one", (actor, id) => changeRecording(actor, id, { title: "Mine now" })],
  ["has one prepared again", prepareAgain],
  ["puts one away", putAwayRecording],
  ["captions one", (actor, id) => importCaptions(actor, id, { language: "en", text: "WEBVTT\n\n00:01.000 --> 00:02.000\nHello\n" })],
];

test.each(ROLES.filter((role) => role !== "mentor"))("a %s works on no recording", async (role: Role) => {
  const mentor = await someMentor();
  const recordingId = await createRecording(mentor);
  const actor = { ...(await createMember(mentor.organisation, "apprentice")), roles: new Set([role]) };
  await expect(viewRecordings(actor)).rejects.toMatchObject({ code: "forbidden" });
  await expect(viewVehicles(actor)).rejects.toMatchObject({ code: "forbidden" });
  for (const [, door] of DOORS) await expect(door(actor, recordingId)).rejects.toMatchObject({ code: "forbidden" });
});

test.each(DOORS)("a mentor of another workshop %s as little as one that isn't there", async (_, door) => {
  const recordingId = await createRecording(await someMentor());
  const stranger = await someMentor();
  await expect(door(stranger, recordingId)).rejects.toMatchObject({ code: "not_found" });
  await expect(door(stranger, randomUUID())).rejects.toMatchObject({ code: "not_found" });
  expect(await viewRecordings(stranger)).toEqual([]);
});

test("details are changed one by one, and what is left out stays", async () => {
  const mentor = await someMentor();
  const recordingId = await createRecording(mentor);
  await changeRecording(mentor, recordingId, { vehicle: { label: "Bay 2 hatch", model: "Five-door, 2019" } });
  await changeRecording(mentor, recordingId, { consent: "consent_given", consentNote: "Both on paper" });
  await changeRecording(mentor, recordingId, { privateDetailsChecked: true });
  const [vehicle] = await viewVehicles(mentor);
  expect(await viewRecording(mentor, recordingId)).toMatchObject({
    title: "Front brake pads", vehicleId: vehicle?.id, consent: "consent_given", consentNote: "Both on paper", privateDetailsCheckedBy: mentor.name,
  });
  await changeRecording(mentor, recordingId, { privateDetailsChecked: false, vehicle: null });
  expect(await viewRecording(mentor, recordingId)).toMatchObject({ vehicleId: null, privateDetailsCheckedAt: null, privateDetailsCheckedBy: null });
});

test("a vehicle of another workshop is no choice; the same label twice is one vehicle", async () => {
  const mentor = await someMentor();
  const other = await someMentor();
  const [recordingId, theirs] = [await createRecording(mentor), await createRecording(other)];
  await changeRecording(other, theirs, { vehicle: { label: "Van", model: "Long" } });
  const [foreign] = await viewVehicles(other);
  await expect(changeRecording(mentor, recordingId, { vehicle: { vehicleId: foreign?.id ?? "" } })).rejects.toMatchObject({ code: "invalid_input" });
  for (const model of ["Short", "Long"]) await changeRecording(mentor, recordingId, { vehicle: { label: "Van", model } });
  expect(await viewVehicles(mentor)).toMatchObject([{ label: "Van", model: "Long" }]);
});

test("captions come in from WebVTT and from SubRip, in place of earlier ones", async () => {
  const mentor = await someMentor();
  const recordingId = await createRecording(mentor);
  const vtt = "WEBVTT\n\n00:01.000 --> 00:02.000\nLift the car.\n";
  expect(await importCaptions(mentor, recordingId, { language: "en", text: vtt })).toEqual({ cues: 1 });
  const srt = "1\r\n00:00:01,500 --> 00:00:03,000\r\nLift the car.\r\n\r\n2\r\n00:00:04,000 --> 00:00:05,000\r\nWheel off.\r\n";
  expect(await importCaptions(mentor, recordingId, { language: "en", text: srt })).toEqual({ cues: 2 });
  const { captions } = await viewRecordingMedia(mentor, recordingId);
  expect(captions).toHaveLength(1);
  expect(captions[0]?.vtt).toContain("00:00:01.500 --> 00:00:03.000\nLift the car.");
});

test.each([
  ["a WebVTT file with a broken time", "WEBVTT\n\n00:01.000 --> 00:02.000\nGood\n\n00:03.0 --> 00:04.000\nBad\n", "line 6"],
  ["SubRip, by the line of the file given", "1\n00:00:01,000 --> 00:00:02,000\nGood\n\n2\n00:00:61,000 --> 00:01:02,000\nBad\n", "line 6"],
  ["a caption after the film's end", "WEBVTT\n\n02:00.000 --> 02:01.000\nLate\n", "line 3"],
  ["no captions at all", "WEBVTT\n", "line 1"],
])("%s is refused with its line, and nothing is changed", async (_, text, line) => {
  const mentor = await someMentor();
  const recordingId = await createRecording(mentor);
  const before = "WEBVTT\n\n00:01.000 --> 00:02.000\nBefore\n";
  await importCaptions(mentor, recordingId, { language: "en", text: before });
  await expect(importCaptions(mentor, recordingId, { language: "en", text })).rejects.toMatchObject({
    code: "invalid_input",
    problems: expect.arrayContaining([expect.objectContaining({ path: line })]),
  });
  expect((await viewRecordingMedia(mentor, recordingId)).captions).toMatchObject([{ vtt: before }]);
});

test("before it is measured, a recording takes no captions", async () => {
  const mentor = await someMentor();
  const recordingId = await createRecording(mentor, { state: "processing", duration_ms: null });
  await expect(importCaptions(mentor, recordingId, { language: "en", text: "WEBVTT\n" })).rejects.toMatchObject({ code: "conflict" });
});

test("only what failed is tried again, and twice at once is once", async () => {
  const mentor = await someMentor();
  await expect(prepareAgain(mentor, await createRecording(mentor))).rejects.toMatchObject({ code: "conflict" });
  const failed = await createRecording(mentor, { state: "failed", failure: "It broke off." });
  await db()("recording_stages").insert([
    { recording_id: failed, stage: "probe", state: "done", percent: 100, attempt: 1 },
    { recording_id: failed, stage: "480p", state: "failed", failure: "It broke off.", attempt: 4 },
  ]);
  const presses = await Promise.allSettled([1, 2, 3].map(() => prepareAgain(mentor, failed)));
  expect(presses.filter(({ status }) => status === "fulfilled")).toHaveLength(1);
  expect(await viewRecording(mentor, failed)).toMatchObject({
    state: "processing", failure: null, stages: [{ stage: "probe", state: "done" }, { stage: "480p", state: "waiting", percent: 0, failure: null }],
  });
  const { rows } = await db().raw(`SELECT count(*) AS n FROM pgboss.job WHERE data ->> 'recordingId' = ?`, [failed]);
  expect(rows[0].n).toBe(1);
});

test("a recording that a module is made of stays; another is put away and gone from every door", async () => {
  const mentor = await someMentor();
  const recordingId = await createRecording(mentor);
  const organisation_id = mentor.organisation.id;
  const [step] = await db()("steps").insert({ organisation_id, recording_id: recordingId, title: "Wheel off", start_ms: 0, end_ms: 1000, facts: {} }).returning("id");
  const [module] = await db()("modules").insert({ organisation_id, title: "Brakes", pass_share: 0.8, created_by: mentor.personId }).returning("id");
  await db()("module_steps").insert({ organisation_id, module_id: module.id, step_id: step.id, position: 0 });
  expect(await viewRecording(mentor, recordingId)).toMatchObject({ steps: 1, modules: [{ moduleId: module.id, title: "Brakes" }] });
  await expect(putAwayRecording(mentor, recordingId)).rejects.toMatchObject({ code: "conflict" });
  await db()("module_steps").where({ module_id: module.id }).delete();
  await putAwayRecording(mentor, recordingId);
  await expect(viewRecording(mentor, recordingId)).rejects.toMatchObject({ code: "not_found" });
  expect(await viewRecordings(mentor)).toEqual([]);
});

test("the list makes as many queries for 300 recordings as for 3", async () => {
  const count = async (rows: number): Promise<number> => {
    const mentor = await someMentor();
    for (let index = 0; index < rows; index++) await createRecording(mentor);
    let queries = 0;
    const note = () => (queries += 1);
    db().on("query", note);
    const list = await viewRecordings(mentor);
    db().removeListener("query", note);
    expect(list).toHaveLength(rows);
    return queries;
  };
  expect(await count(300)).toBe(await count(3));
});
