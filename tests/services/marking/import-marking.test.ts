import { randomUUID } from "node:crypto";
import { expect, test } from "vitest";
import type { Question } from "@/lib/core/questions/types";
import type { Actor } from "@/lib/core/roles";
import { NO_FACTS, type Step } from "@/lib/core/steps/types";
import { readVtt } from "@/lib/core/webvtt/read-vtt";
import { importMarking } from "@/lib/services/marking/import-marking";
import { saveMarking } from "@/lib/services/marking/save-marking";
import { viewMarking } from "@/lib/services/marking/view-marking";
import { viewChaptersTrack, viewMarkingTrack } from "@/lib/services/marking/view-tracks";
import { testDatabase } from "../../support/database";
import { createMember, createOrganisation } from "../../support/factories";

const { db } = testDatabase();

async function createRecording(mentor: Actor): Promise<string> {
  const [id, organisation_id] = [randomUUID() as string, mentor.organisation.id];
  await db()("files").insert({ id, organisation_id, store_key: id, media_type: "video/mp4", size_bytes: 1000 });
  await db()("recordings").insert({ id, organisation_id, title: "Test film", recorded_by: mentor.personId, source_file_id: id, state: "ready", duration_ms: 60_000 });
  return id;
}

const step = (startMs: number, endMs: number, title: string): Step => ({ id: randomUUID(), title, startMs, endMs, facts: NO_FACTS });

/** A marking out with everything that a text format could trip over. */
async function markedOut() {
  const mentor = await createMember(await createOrganisation(), "mentor");
  const recordingId = await createRecording(mentor);
  const first: Step = {
    ...step(0, 10_500, 'Lift & "stand" <safely> --> then brake'),
    facts: {
      fasteners: [{ id: "f1", name: "Bolt --> M10", count: 2, acrossFlatsMm: 17, oneTimeUse: true, tightening: { entered: "50 Nm + 90°", newtonMetres: 50, angleDegrees: 90, source: "invented for this test" } }],
      tools: ["Wrench, 1/2\""],
      parts: ["Größe 🔧"],
      fluids: [{ kind: "brake fluid", amount: "0.5 L" }],
      cautions: [{ id: "c1", grade: "warning", sign: "W015", hazard: "The car can drop.", instruction: "Set stands --> then work.", waitSeconds: 30 }],
      faultCodes: ["C0035"],
    },
  };
  const second = step(10_500, 60_000, "Wheel off");
  const asked = (over: Partial<Question>): Question => ({ id: randomUUID(), stepId: first.id, atMs: 4000, prompt: "a --> b", explanation: "line one\nline two", lookAgainMs: 1000, safetyCritical: true, body: { kind: "number", unit: "N·m", value: 50, tolerance: 1.5, slips: [{ value: 5, hint: "ten --> one" }] }, ...over });
  const questions = [
    asked({}),
    asked({ atMs: 10_500, body: { kind: "one_of", choices: [{ id: "x", text: "-->", right: true, why: "" }, { id: "y", text: "<b>", right: false, why: "no" }] } }),
    asked({ stepId: second.id, atMs: 60_000, body: { kind: "put_in_order", items: [{ id: "1", text: "up" }, { id: "2", text: "down" }], neverBefore: [["2", "1"]] } }),
  ];
  await saveMarking(mentor, recordingId, { version: 0, steps: [first, second], questions });
  const files = { chapters: await viewChaptersTrack(mentor, recordingId), marking: await viewMarkingTrack(mentor, recordingId) };
  return { mentor, recordingId, first, second, files };
}

test("our own files come back as the same marking out and the same bytes", async () => {
  const { mentor, recordingId, files } = await markedOut();
  const { version: _, savedAt: __, ...before } = await viewMarking(mentor, recordingId);
  expect(await importMarking(mentor, recordingId, { version: 1, ...files })).toMatchObject({ version: 2, ...before });
  expect(await viewChaptersTrack(mentor, recordingId)).toBe(files.chapters);
  expect(await viewMarkingTrack(mentor, recordingId)).toBe(files.marking);
});

// W3C WebVTT: "-->" may stand in no cue text, so every one in our files is a timing's.
test("an arrow inside text stands in no file as an arrow", async () => {
  const { files } = await markedOut();
  for (const text of [files.chapters, files.marking]) {
    expect(text.match(/-->/g)).toHaveLength(readVtt(text).cues.length);
    expect(readVtt(text).problems).toEqual([]);
  }
});

test("steps alone are taken with the facts and questions of those that stay; questions alone leave the steps", async () => {
  const { mentor, recordingId, first, files } = await markedOut();
  const shorter = files.chapters.replace("00:00:10.500 --> 00:01:00.000\nWheel off", "00:00:20.000 --> 00:00:50.000\nWheel on");
  const refusal = importMarking(mentor, recordingId, { version: 1, chapters: shorter, marking: null });
  await expect(refusal).rejects.toMatchObject({ code: "invalid_input", problems: [{ path: "steps, line 8" }] });

  const only = files.chapters.slice(0, files.chapters.lastIndexOf("\n\n") + 1);
  const taken = await importMarking(mentor, recordingId, { version: 1, chapters: only, marking: null });
  expect(taken.steps).toEqual([first]);
  expect(taken.questions).toHaveLength(2);

  const none = await importMarking(mentor, recordingId, { version: 2, chapters: null, marking: "WEBVTT\n" });
  expect(none).toMatchObject({ steps: [{ id: first.id, facts: NO_FACTS }], questions: [] });
});

const FACTS = (facts: string, stepId: string) => `WEBVTT\n\n00:00.000 --> 00:01.000\n{"kind":"facts","stepId":"${stepId}","facts":${facts}}\n`;
const EMPTY = JSON.stringify(NO_FACTS);

test.each<[string, (own: { first: Step; chapters: string }) => { chapters: string | null; marking: string | null }, string]>([
  ["no WebVTT at all", () => ({ chapters: "steps:\n", marking: null }), "steps, line 1"],
  ["steps that overlap", () => ({ chapters: "WEBVTT\n\n00:00.000 --> 00:05.000\nOne\n\n00:04.000 --> 00:06.000\nTwo\n", marking: null }), "steps, line 6"],
  ["a step past the end", () => ({ chapters: "WEBVTT\n\n00:50.000 --> 01:00.001\nOne\n", marking: null }), "steps, line 3"],
  ["a name that is too long", () => ({ chapters: `WEBVTT\n\n00:00.000 --> 00:05.000\n${"x".repeat(201)}\n`, marking: null }), "steps, line 4"],
  ["one id twice", ({ first, chapters }) => ({ chapters: `${chapters.replace("Wheel off", "x").slice(0, chapters.lastIndexOf("\n\n"))}\n\n${first.id}\n00:20.000 --> 00:30.000\nAgain\n`, marking: null }), "steps, line 7"],
  ["no JSON", () => ({ chapters: null, marking: "WEBVTT\n\n00:00.000 --> 00:01.000\nhello\n" }), "facts and questions, line 4"],
  ["JSON of another kind", () => ({ chapters: null, marking: 'WEBVTT\n\n00:00.000 --> 00:01.000\n{"kind":"note"}\n' }), "facts and questions, line 4"],
  ["JSON that is no object", () => ({ chapters: null, marking: "WEBVTT\n\n00:00.000 --> 00:01.000\nnull\n" }), "facts and questions, line 4"],
  ["facts with an unknown field", ({ first }) => ({ chapters: null, marking: FACTS(EMPTY.replace("{", '{"torque":1,'), first.id) }), "facts and questions, line 4"],
  ["facts of no step", () => ({ chapters: null, marking: FACTS(EMPTY, randomUUID()) }), "facts and questions, line 4"],
  ["text with a NUL in its JSON", ({ first }) => ({ chapters: null, marking: FACTS(EMPTY.replace('"tools":[]', '"tools":["a\\u0000b"]'), first.id) }), "facts and questions, line 4"],
  [
    "a question outside its step",
    ({ first }) => ({
      chapters: null,
      marking: `WEBVTT\n\n00:30.000 --> 00:30.001\n{"kind":"question","stepId":"${first.id}","prompt":"?","explanation":"","lookAgainMs":0,"safetyCritical":false,"body":{"kind":"number","unit":"mm","value":1,"tolerance":0,"slips":[]}}\n`,
    }),
    "facts and questions, line 4",
  ],
])("%s is refused with its line, and nothing is half done", async (_, make, path) => {
  const { mentor, recordingId, first, files } = await markedOut();
  const before = await viewMarking(mentor, recordingId);
  const refusal = importMarking(mentor, recordingId, { version: 1, ...make({ first, chapters: files.chapters }) });
  await expect(refusal).rejects.toMatchObject({ code: "invalid_input", problems: expect.arrayContaining([expect.objectContaining({ path })]) });
  expect(await viewMarking(mentor, recordingId)).toEqual(before);
});

test("good steps beside bad questions are not taken either", async () => {
  const { mentor, recordingId, files } = await markedOut();
  const before = await viewMarking(mentor, recordingId);
  await expect(importMarking(mentor, recordingId, { version: 1, chapters: files.chapters.replace("Wheel off", "Wheel on"), marking: "WEBVTT\n\nno" })).rejects.toMatchObject({ code: "invalid_input" });
  expect(await viewMarking(mentor, recordingId)).toEqual(before);
});

test("files of one recording may be taken for another; what they mark out there is its own", async () => {
  const { mentor, recordingId, files } = await markedOut();
  const other = await createRecording(mentor);
  const taken = await importMarking(mentor, other, { version: 0, ...files });
  const original = await viewMarking(mentor, recordingId);
  expect(taken.steps.map(({ title }) => title)).toEqual(original.steps.map(({ title }) => title));
  expect(taken.questions).toHaveLength(3);
  const ids = new Set([...original.steps, ...original.questions, ...taken.steps, ...taken.questions].map(({ id }) => id));
  expect(ids.size).toBe(10);
});

test("a file on top of an older version is refused", async () => {
  const { mentor, recordingId, files } = await markedOut();
  await expect(importMarking(mentor, recordingId, { version: 0, ...files })).rejects.toMatchObject({ code: "conflict" });
});
