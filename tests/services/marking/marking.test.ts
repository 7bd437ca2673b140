import { randomUUID } from "node:crypto";
import { expect, test } from "vitest";
import type { Question } from "@/lib/core/questions/types";
import { ROLES, type Actor, type Role } from "@/lib/core/roles";
import { NO_FACTS, type Step } from "@/lib/core/steps/types";
import { markingSchema } from "@/lib/schemas/marking";
import { importMarking } from "@/lib/services/marking/import-marking";
import { saveMarking } from "@/lib/services/marking/save-marking";
import { viewBench } from "@/lib/services/marking/view-bench";
import { viewMarking } from "@/lib/services/marking/view-marking";
import { viewCaptionsTrack, viewChaptersTrack, viewMarkingTrack } from "@/lib/services/marking/view-tracks";
import { testDatabase } from "../../support/database";
import { createMember, createOrganisation } from "../../support/factories";

const { db } = testDatabase();
const MINUTE = 60_000;

async function createRecording(mentor: Actor, over: object = {}): Promise<string> {
  const organisation_id = mentor.organisation.id;
  const id = randomUUID();
  await db()("files").insert({ id, organisation_id, store_key: id, media_type: "video/mp4", size_bytes: 1000 });
  const row = { id, organisation_id, title: "Test film", recorded_by: mentor.personId, source_file_id: id, state: "ready", duration_ms: MINUTE };
  await db()("recordings").insert({ ...row, ...over });
  return id;
}
const bench = async () => {
  const mentor = await createMember(await createOrganisation(), "mentor");
  return { mentor, recordingId: await createRecording(mentor) };
};
const step = (startMs: number, endMs: number, over: Partial<Step> = {}): Step => ({ id: randomUUID(), title: `Step at ${startMs}`, startMs, endMs, facts: NO_FACTS, ...over });
const question = (of: Step, over: Partial<Question> = {}): Question => ({
  id: randomUUID(),
  stepId: of.id,
  atMs: of.startMs + 500,
  prompt: "How thick?",
  explanation: "",
  lookAgainMs: of.startMs,
  safetyCritical: false,
  body: { kind: "number", unit: "mm", value: 22, tolerance: 0.1, slips: [{ value: 2.2, hint: "A factor of ten." }] },
  ...over,
});
const withTightening = (entered: string, newtonMetres = 1): Step["facts"] => ({
  ...NO_FACTS,
  fasteners: [{ id: "f1", name: "Guide pin", count: 2, acrossFlatsMm: 13, oneTimeUse: true, tightening: { entered, newtonMetres, angleDegrees: null, source: "invented for this test" } }],
});

const DOORS: [string, (actor: Actor, id: string) => Promise<unknown>][] = [
  ["sees the marking out", viewMarking],
  ["opens the bench", viewBench],
  ["saves", (actor, id) => saveMarking(actor, id, { version: 0, steps: [], questions: [] })],
  ["downloads steps", viewChaptersTrack],
  ["downloads questions", viewMarkingTrack],
  ["downloads captions", viewCaptionsTrack],
  ["takes files in", (actor, id) => importMarking(actor, id, { version: 0, chapters: "WEBVTT\n", marking: null })],
];

test.each(ROLES.filter((role) => role !== "mentor"))("a %s marks nothing out and sees no answers", async (role: Role) => {
  const { mentor, recordingId } = await bench();
  const actor = { ...(await createMember(mentor.organisation, "apprentice")), roles: new Set([role]) };
  for (const [, door] of DOORS) await expect(door(actor, recordingId)).rejects.toMatchObject({ code: "forbidden" });
});

test.each(DOORS)("a mentor of another workshop who %s finds nothing there", async (_, door) => {
  const { recordingId } = await bench();
  const stranger = await createMember(await createOrganisation(), "mentor");
  await expect(door(stranger, recordingId)).rejects.toMatchObject({ code: "not_found" });
  await expect(door(stranger, randomUUID())).rejects.toMatchObject({ code: "not_found" });
});

test("what is saved comes back in the film's order, with who saved it; ids keep their rows, and what is left out goes", async () => {
  const { mentor, recordingId } = await bench();
  const [late, early] = [step(20_000, 30_000), step(0, 20_000)];
  const asked = question(late);
  await saveMarking(mentor, recordingId, { version: 0, steps: [late, early], questions: [asked] });
  const [before] = await db()("steps").where({ id: late.id });

  const moved = { ...late, title: "Moved", startMs: 25_000 };
  await saveMarking(mentor, recordingId, { version: 1, steps: [moved], questions: [{ ...asked, atMs: 26_000 }] });
  const marking = await viewMarking(mentor, recordingId);
  expect(marking).toMatchObject({ version: 2, steps: [moved], savedBy: mentor.name });
  expect(Date.parse(marking.savedAt ?? "")).toBeGreaterThan(Date.now() - MINUTE);
  const [after] = await db()("steps").where({ id: late.id });
  expect(after.created_at).toEqual(before.created_at);
});

test("two steps may change places in one save", async () => {
  const { mentor, recordingId } = await bench();
  const [a, b] = [step(0, 10_000), step(10_000, 20_000)];
  await saveMarking(mentor, recordingId, { version: 0, steps: [a, b], questions: [] });
  const swapped = [{ ...a, startMs: 10_000, endMs: 20_000 }, { ...b, startMs: 0, endMs: 10_000 }];
  await saveMarking(mentor, recordingId, { version: 1, steps: swapped, questions: [] });
  expect((await viewMarking(mentor, recordingId)).steps.map(({ id }) => id)).toEqual([b.id, a.id]);
});

test("of two who save at once on the same version one is told", async () => {
  const { mentor, recordingId } = await bench();
  const save = (title: string) => saveMarking(mentor, recordingId, { version: 0, steps: [step(0, 1000, { title })], questions: [] });
  const outcomes = await Promise.allSettled([save("mine"), save("theirs")]);
  expect(outcomes.filter(({ status }) => status === "fulfilled")).toHaveLength(1);
  expect(outcomes.find(({ status }) => status === "rejected")).toMatchObject({ reason: { code: "conflict" } });
  expect((await viewMarking(mentor, recordingId)).steps).toHaveLength(1);
  await expect(save("too late")).rejects.toMatchObject({ code: "conflict" });
});

test("each problem is told with its path, and then nothing is kept", async () => {
  const { mentor, recordingId } = await bench();
  const [a, b, c] = [step(0, 10_000), step(9000, 20_000), step(50_000, MINUTE + 1)];
  const outside = question(a, { atMs: 30_000 });
  const lost = question(a, { stepId: randomUUID(), body: { kind: "one_of", choices: [] } });
  const torn = step(30_000, 40_000, { facts: withTightening("tight enough") });
  const refusal = saveMarking(mentor, recordingId, { version: 0, steps: [a, b, c, torn], questions: [outside, lost] });
  await expect(refusal).rejects.toMatchObject({ code: "invalid_input" });
  const { problems } = await refusal.catch((error: { problems: { path: string }[] }) => error) as { problems: { path: string }[] };
  expect(problems.map(({ path }) => path)).toEqual([
    "steps.3.facts.fasteners.0.tightening.entered",
    "steps.1",
    "steps.2",
    "questions.0",
    "questions.1",
    "questions.1",
    "questions.1",
  ]);
  expect(await viewMarking(mentor, recordingId)).toMatchObject({ version: 0, steps: [], questions: [] });
});

test("ids are used once, and not those of another recording", async () => {
  const { mentor, recordingId } = await bench();
  const mine = step(0, 1000);
  await saveMarking(mentor, recordingId, { version: 0, steps: [mine], questions: [] });
  const twice = { version: 1, steps: [mine, { ...step(2000, 3000), id: mine.id }], questions: [] };
  await expect(saveMarking(mentor, recordingId, twice)).rejects.toMatchObject({ code: "invalid_input", problems: [{ path: "steps.1.id" }] });
  const elsewhere = await createRecording(mentor);
  await expect(saveMarking(mentor, elsewhere, { version: 0, steps: [mine], questions: [] })).rejects.toMatchObject({ code: "invalid_input" });
  expect((await viewMarking(mentor, recordingId)).steps).toEqual([mine]);
});

// 18 lbf·ft × 1.3558179483314004 N·m, exact by the definitions of pound, foot and standard gravity.
test("the server understands tightening values itself, whatever numbers came along", async () => {
  const { mentor, recordingId } = await bench();
  await saveMarking(mentor, recordingId, { version: 0, steps: [step(0, 1000, { facts: withTightening("18 lbf ft + 90°", 999) })], questions: [] });
  const tightening = (await viewMarking(mentor, recordingId)).steps[0]?.facts.fasteners[0]?.tightening;
  expect(tightening).toMatchObject({ entered: "18 lbf ft + 90°", angleDegrees: 90 });
  expect(tightening?.newtonMetres).toBeCloseTo(24.404723, 6);
});

test("a film that isn't measured yet can't be marked out", async () => {
  const { mentor } = await bench();
  const recordingId = await createRecording(mentor, { state: "processing", duration_ms: null });
  await expect(saveMarking(mentor, recordingId, { version: 0, steps: [], questions: [] })).rejects.toMatchObject({ code: "conflict" });
  expect((await viewBench(mentor, recordingId)).film).toBeNull();
});

test("the door takes no unknown field, no id that isn't one, and no character that can't be kept", () => {
  const good = { version: 0, steps: [step(0, 1000)], questions: [] };
  expect(markingSchema.safeParse(good).success).toBe(true);
  for (const over of [{ id: "1" }, { title: "" }, { title: "two\nlines" }, { title: "half \ud800" }, { title: "nul \0" }, { startMs: 0.5 }, { extra: 1 }]) {
    expect(markingSchema.safeParse({ ...good, steps: [{ ...good.steps[0], ...over }] }).success, JSON.stringify(over)).toBe(false);
  }
});
