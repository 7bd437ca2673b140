import { expect, test } from "vitest";
import { renditionSize } from "@/lib/core/recordings/rendition-size";
import { planStoryboard, writeStoryboardTrack } from "@/lib/core/recordings/storyboard";
import { titleFromFileName } from "@/lib/core/recordings/title-from-file-name";
import { partCount, partRange, partSizeBytes } from "@/lib/core/uploads/part-plan";

// Worked by hand: shorter side to 480, the other in proportion, both even.
test.each([
  [1920, 1080, 480, 854, 480],
  [1080, 1920, 480, 480, 854],
  [1920, 1080, 720, 1280, 720],
  [640, 360, 720, 640, 360],
  [321, 181, 720, 322, 182],
  [1000, 1000, 480, 480, 480],
])("%i × %i at %ip is %i × %i", (width, height, side, madeWidth, madeHeight) => {
  expect(renditionSize({ width, height }, side)).toEqual({ width: madeWidth, height: madeHeight });
});

// Source of the limits: Amazon S3 user guide, "Amazon S3 multipart upload limits": 10,000 parts of 5 MiB to 5 GiB, the last may be smaller.
test.each([1, 5 * 1024 ** 2, 8 * 1024 ** 2, 8 * 1024 ** 2 + 1, 10 * 1024 ** 3, 4 * 1024 ** 4])("the parts of a file of %i bytes fit the store and make up the file", (bytes) => {
  const part = partSizeBytes(bytes);
  const count = partCount(bytes, part);
  expect(part).toBeGreaterThanOrEqual(5 * 1024 ** 2);
  expect(part).toBeLessThanOrEqual(5 * 1024 ** 3);
  expect(count).toBeLessThanOrEqual(10_000);
  expect(partRange(1, bytes, part).start).toBe(0);
  expect(partRange(count, bytes, part).end).toBe(bytes);
  if (count > 1) expect(partRange(2, bytes, part).start).toBe(partRange(1, bytes, part).end);
});

test("a storyboard has a picture for every stretch of the film and none beyond it", () => {
  const plan = planStoryboard(3 * 3600_000, { width: 1280, height: 720 });
  expect(plan).toEqual({ intervalMs: 75_000, tiles: 144, columns: 12, rows: 12, tile: { width: 160, height: 90 } });
  const short = planStoryboard(2500, { width: 480, height: 854 });
  expect(short).toEqual({ intervalMs: 1000, tiles: 3, columns: 3, rows: 1, tile: { width: 90, height: 160 } });
  expect(writeStoryboardTrack(short, 2500, "storyboard.jpg")).toBe(
    "WEBVTT\n\n00:00:00.000 --> 00:00:01.000\nstoryboard.jpg#xywh=0,0,90,160\n" +
      "\n00:00:01.000 --> 00:00:02.000\nstoryboard.jpg#xywh=90,0,90,160\n" +
      "\n00:00:02.000 --> 00:00:02.500\nstoryboard.jpg#xywh=180,0,90,160\n",
  );
});

test.each([
  ["Front brake pads, near side.MOV", "Front brake pads, near side"],
  ["aux_belt__take 2.mp4", "aux belt take 2"],
  ["VID_20261201_101530.mp4", "Recording of Tue 1 Dec 2026"],
  ["belt.mp4", "belt"],
  ["IMG_4711.MOV", "Recording of Tue 1 Dec 2026"],
  ["20261201.mp4", "Recording of Tue 1 Dec 2026"],
  [".mp4", "Recording of Tue 1 Dec 2026"],
])("%s begins as “%s”", (fileName, title) => {
  expect(titleFromFileName(fileName, Date.UTC(2026, 11, 1, 10))).toBe(title);
});
