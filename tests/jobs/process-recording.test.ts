import { readFile } from "node:fs/promises";
import { readdirSync } from "node:fs";
import { tmpdir } from "node:os";
import { expect, test, vi } from "vitest";
import type { Actor } from "@/lib/core/roles";
import { readVtt } from "@/lib/core/webvtt/read-vtt";
import { processRecording } from "@/lib/jobs/process-recording";
import { prepareAgain } from "@/lib/services/recordings/prepare-again";
import { viewRecording } from "@/lib/services/recordings/view-recording";
import { viewRecordingMedia } from "@/lib/services/recordings/view-recording-media";
import type { RecordingView } from "@/lib/schemas/recordings";
import { recordingPrefix } from "@/storage/keys";
import { getStore } from "@/storage/store";
import { testClips } from "../support/clips";
import { testDatabase } from "../support/database";
import { createMember, createOrganisation } from "../support/factories";
import { testStore } from "../support/store";
import { bringIn } from "../support/uploads";

// Real films are converted: give a busy machine time.
vi.setConfig({ testTimeout: 90_000 });

const { db } = testDatabase();
testStore();
const clips = testClips();

const someMentor = async () => createMember(await createOrganisation(), "mentor");

/** Brings a file in, lets the worker at it, and gives what the mentor then sees. */
async function prepare(mentor: Actor, bytes: Buffer): Promise<RecordingView> {
  const { recordingId } = await bringIn(mentor, bytes);
  await processRecording({ recordingId });
  return viewRecording(mentor, recordingId ?? "");
}

async function fetched(mentor: Actor, recordingId: string, part: "p480" | "p720" | "poster" | "storyboardSheet"): Promise<string> {
  const address = (await viewRecordingMedia(mentor, recordingId))[part];
  const answer = await fetch(address ?? "");
  expect(answer.status).toBe(200);
  return clips.write(`${recordingId}-${part}`, Buffer.from(await answer.arrayBuffer()));
}

const stream = (probed: { streams: Record<string, never>[] }, kind: string): Record<string, unknown> | undefined =>
  probed.streams.find((each) => each.codec_type === (kind as never));

test("a film becomes two MP4 films with the index up front, a poster and a storyboard", async () => {
  const mentor = await someMentor();
  const source = await clips.film("large.mp4", { size: "1920x1080", args: ["-metadata", "location=+51.5-000.1/"] });
  const recording = await prepare(mentor, source);
  expect(recording).toMatchObject({ state: "ready", failure: null, width: 1920, height: 1080, hasSound: true });
  expect(recording.durationMs).toBeGreaterThanOrEqual(1990);
  expect(recording.durationMs).toBeLessThanOrEqual(2010);
  expect(recording.stages.map(({ stage, state, percent }) => `${stage} ${state} ${percent}`)).toEqual([
    "probe done 100", "480p done 100", "720p done 100", "poster done 100", "storyboard done 100",
  ]);

  for (const [part, width, height] of [["p480", 854, 480], ["p720", 1280, 720]] as const) {
    const path = await fetched(mentor, recording.recordingId, part);
    const probed = await clips.probe(path);
    expect(stream(probed, "video")).toMatchObject({ codec_name: "h264", pix_fmt: "yuv420p", width, height });
    expect(stream(probed, "audio")).toMatchObject({ codec_name: "aac" });
    // ISO/IEC 14496-12: a file is a row of boxes, each with its length and four letters. The index (moov) must come before the film (mdat).
    const bytes = await readFile(path);
    expect(bytes.indexOf("moov")).toBeGreaterThan(0);
    expect(bytes.indexOf("moov")).toBeLessThan(bytes.indexOf("mdat"));
    expect(JSON.stringify(probed.format)).not.toContain("51.5");
  }
  expect(stream(await clips.probe(await fetched(mentor, recording.recordingId, "poster")), "video")).toMatchObject({ codec_name: "mjpeg", width: 1280, height: 720 });
  expect(stream(await clips.probe(await fetched(mentor, recording.recordingId, "storyboardSheet")), "video")).toMatchObject({ width: 320, height: 90 });

  const track = await (await fetch((await viewRecordingMedia(mentor, recording.recordingId)).storyboardTrack ?? "")).text();
  const { cues, problems } = readVtt(track);
  expect(problems).toEqual([]);
  expect(cues.map(({ startMs, endMs, text }) => [startMs, endMs, text])).toEqual([
    [0, 1000, "storyboard.jpg#xywh=0,0,160,90"],
    [1000, recording.durationMs, "storyboard.jpg#xywh=160,0,160,90"],
  ]);
  // The original stays as it came.
  const { store_key } = await db()("files").where({ id: recording.recordingId }).first();
  const { body } = await getStore().getObject(store_key);
  expect(Buffer.concat(await body.toArray()).equals(source)).toBe(true);
});

test("a film held upright is turned and stays upright; a small one is never made larger", async () => {
  const mentor = await someMentor();
  await clips.film("lying.mp4", { size: "480x270" });
  // The phone films lying down and notes that it was turned by a quarter: ISO/IEC 14496-12, the track's matrix.
  await clips.ffmpeg("-display_rotation", "90", "-i", clips.path("lying.mp4"), "-c", "copy", clips.path("turned.mp4")).catch(() =>
    clips.ffmpeg("-i", clips.path("lying.mp4"), "-c", "copy", "-metadata:s:v:0", "rotate=90", clips.path("turned.mp4")),
  );
  const turned = await prepare(mentor, await readFile(clips.path("turned.mp4")));
  expect(turned).toMatchObject({ state: "ready", width: 270, height: 480 });
  const made = stream(await clips.probe(await fetched(mentor, turned.recordingId, "p720")), "video");
  expect(made).toMatchObject({ width: 270, height: 480 });
  expect(made?.side_data_list).toBeUndefined();

  const portrait = await prepare(mentor, await clips.film("portrait.mp4", { size: "1080x1920", seconds: 1 }));
  expect(stream(await clips.probe(await fetched(mentor, portrait.recordingId, "p480")), "video")).toMatchObject({ width: 480, height: 854 });
});

test("a film without sound is one all the same", async () => {
  const mentor = await someMentor();
  const recording = await prepare(mentor, await clips.film("silent.mkv", { sound: false }));
  expect(recording).toMatchObject({ state: "ready", hasSound: false });
  expect(stream(await clips.probe(await fetched(mentor, recording.recordingId, "p480")), "audio")).toBeUndefined();
});

test("a film whose container does not tell its length, as browsers record them, is measured", async () => {
  const mentor = await someMentor();
  await clips.film("whole.mkv", { seconds: 1 });
  await clips.ffmpeg("-i", clips.path("whole.mkv"), "-c", "copy", "-f", "matroska", "-live", "1", clips.path("live.mkv"));
  const recording = await prepare(mentor, await readFile(clips.path("live.mkv")));
  expect(recording.state).toBe("ready");
  expect(Math.abs((recording.durationMs ?? 0) - 1000)).toBeLessThanOrEqual(50);
});

test.each([
  ["a text file named .mp4", async () => Buffer.from("This is not a film.\n".repeat(50)), /not a film that can be read/],
  ["a picture named .mp4", async () => picture("small.png", "320x240"), /not a film that can be read/],
  ["a picture that claims 60,000 × 60,000 points", async () => pngBomb(), /not a film that can be read/],
  ["a single picture in a film's container", async () => onePicture(), /single picture/],
  ["sound alone", async () => soundAlone(), /sound and no picture/],
  ["an empty container", async () => Buffer.from("0000001c667479706d703432000000016d70343169736f6d6d703432", "hex"), /not a film|no picture/],
  ["a film cut off in the middle", async () => cutOff(), /breaks off at 0:0\d of 0:04|not a film/],
])("%s is refused with a reason, and can be tried again", async (_, make, reason) => {
  const mentor = await someMentor();
  const recording = await prepare(mentor, await make());
  expect(recording.state).toBe("failed");
  expect(recording.failure).toMatch(reason);
  expect(recording.stages.filter(({ state }) => state === "failed")).toHaveLength(1);
  await prepareAgain(mentor, recording.recordingId);
  expect(await viewRecording(mentor, recording.recordingId)).toMatchObject({ state: "processing", failure: null });
  await processRecording({ recordingId: recording.recordingId });
  expect(await viewRecording(mentor, recording.recordingId)).toMatchObject({ state: "failed", failure: recording.failure });
});

test("a playlist that names a film on the worker's own disk opens nothing", async () => {
  const mentor = await someMentor();
  await clips.film("secret.ts", { args: ["-f", "mpegts"] });
  const playlist = `#EXTM3U\n#EXT-X-TARGETDURATION:2\n#EXTINF:2,\nfile://${clips.path("secret.ts")}\n#EXT-X-ENDLIST\n`;
  const list = `ffconcat version 1.0\nfile '${clips.path("secret.ts")}'\n`;
  for (const text of [playlist, list]) {
    const recording = await prepare(mentor, Buffer.from(text));
    expect(recording).toMatchObject({ state: "failed", durationMs: null });
    expect(await viewRecordingMedia(mentor, recording.recordingId)).toMatchObject({ p480: null, p720: null, poster: null });
  }
});

test("a film longer than is taken is refused by its length", async () => {
  const mentor = await someMentor();
  // Three hours and a bit, a picture every ten minutes: small to make, long to watch.
  await clips.ffmpeg("-f", "lavfi", "-i", "color=s=64x64:r=1/600:d=11400", "-c:v", "libx264", "-preset", "ultrafast", clips.path("long.mp4"));
  const recording = await prepare(mentor, await readFile(clips.path("long.mp4")));
  expect(recording.state).toBe("failed");
  expect(recording.failure).toMatch(/lasts 3:\d\d:\d\d; at most 3:00:00/);
});

test("nothing of the work stays on the worker's disk", async () => {
  const mentor = await someMentor();
  const good = await prepare(mentor, await clips.film("tidy.mp4", { seconds: 1, size: "320x180" }));
  const bad = await prepare(mentor, Buffer.from("no film"));
  const left = readdirSync(tmpdir()).filter((name) => name.includes(good.recordingId) || name.includes(bad.recordingId));
  expect(left).toEqual([]);
});

test("done twice, it is the same objects and rows", async () => {
  const mentor = await someMentor();
  const recording = await prepare(mentor, await clips.film("twice.mp4", { seconds: 1, size: "320x180" }));
  const ids = { organisationId: mentor.organisation.id, recordingId: recording.recordingId };
  const keys = async () => {
    const found: string[] = [];
    for await (const key of getStore().listKeys(recordingPrefix(ids))) found.push(key.replace(recordingPrefix(ids), ""));
    return found;
  };
  const expected = ["480p.mp4", "720p.mp4", "poster.jpg", "source", "storyboard.jpg", "storyboard.vtt"];
  expect(await keys()).toEqual(expected);
  await processRecording({ recordingId: recording.recordingId });
  await db()("recordings").where({ id: recording.recordingId }).update({ state: "processing" });
  await db()("recording_stages").where({ recording_id: recording.recordingId }).update({ state: "waiting" });
  await processRecording({ recordingId: recording.recordingId });
  expect(await viewRecording(mentor, recording.recordingId)).toMatchObject({ state: "ready" });
  expect(await keys()).toEqual(expected);
  expect(await db()("renditions").where({ recording_id: recording.recordingId })).toHaveLength(5);
});

async function picture(name: string, size: string): Promise<Buffer> {
  await clips.ffmpeg("-f", "lavfi", "-i", `testsrc2=s=${size}:d=1`, "-frames:v", "1", clips.path(name));
  return readFile(clips.path(name));
}

/** A few hundred bytes that ask for gigabytes. Source: PNG specification, 11.2.2 IHDR: width and height are its first eight bytes. */
async function pngBomb(): Promise<Buffer> {
  const png = await picture("bomb.png", "64x64");
  png.writeUInt32BE(60_000, 16);
  png.writeUInt32BE(60_000, 20);
  return png;
}

async function onePicture(): Promise<Buffer> {
  await clips.ffmpeg("-f", "lavfi", "-i", "testsrc2=s=320x180:d=1", "-frames:v", "1", "-c:v", "libx264", clips.path("one.mp4"));
  return readFile(clips.path("one.mp4"));
}

async function soundAlone(): Promise<Buffer> {
  await clips.ffmpeg("-f", "lavfi", "-i", "sine=d=1", "-c:a", "aac", clips.path("sound.m4a"));
  return readFile(clips.path("sound.m4a"));
}

/** The index stands up front and promises four seconds; the film ends before. */
async function cutOff(): Promise<Buffer> {
  const whole = await clips.film("whole.mp4", { seconds: 4, args: ["-movflags", "+faststart"] });
  return whole.subarray(0, Math.floor(whole.length / 2));
}
