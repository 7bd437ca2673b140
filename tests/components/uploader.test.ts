import { expect, test, vi } from "vitest";
import { ApiProblem } from "@/components/api/client";
import { PartRefused, type PutPart } from "@/components/upload/put-part";
import { formatLeft, RateMeter } from "@/components/upload/rate-meter";
import type { UploadDoors } from "@/components/upload/upload-doors";
import { sendFile, type SendingState } from "@/components/upload/uploader";
import type { UploadView } from "@/lib/schemas/uploads";

const PART = 1000;

/** A server and a store in memory, which keep the promises of the doors. `trouble` may refuse a part before it is taken. */
function somePlace(sizeBytes: number, { received = [] as number[], trouble = () => {} }: { received?: number[]; trouble?: (part: number) => void } = {}) {
  const parts = new Map<number, number>(received.map((number) => [number, PART]));
  const asked: string[] = [];
  let atOnce = 0;
  let mostAtOnce = 0;
  let completed = false;
  const view = (): UploadView => ({
    uploadId: "u1", purpose: "recording", fileName: "f", sizeBytes, modifiedMs: 1, partSizeBytes: PART, state: completed ? "completed" : "open",
    receivedParts: [...parts.keys()], receivedBytes: [...parts.values()].reduce((sum, bytes) => sum + bytes, 0),
  });
  const doors: UploadDoors = {
    start: async () => view(),
    status: async () => view(),
    addresses: async (_, numbers) => {
      asked.push(numbers.join(","));
      return numbers.map((partNumber) => ({ partNumber, url: `part:${partNumber}` }));
    },
    complete: async () => {
      if (view().receivedBytes !== sizeBytes) throw new ApiProblem(409, "conflict", "Some parts are missing.", []);
      completed = true;
      return { fileId: "f1", recordingId: "r1" };
    },
    cancel: async () => ({}),
  };
  const put: PutPart = async (url, body, onSent, signal) => {
    const number = Number(url.slice(5));
    mostAtOnce = Math.max(mostAtOnce, (atOnce += 1));
    try {
      await new Promise((resolve) => setTimeout(resolve, 5));
      signal.throwIfAborted();
      trouble(number);
      onSent(body.size);
      parts.set(number, body.size);
    } finally {
      atOnce -= 1;
    }
  };
  return { doors, put, parts, asked, most: () => mostAtOnce };
}

const fileOf = (sizeBytes: number) => new File([new Uint8Array(sizeBytes)], "brakes.mp4", { lastModified: 1 });
const options = (place: ReturnType<typeof somePlace>, onState?: (state: SendingState) => void) => ({
  org: "o", purpose: "recording" as const, signal: new AbortController().signal, doors: place.doors, put: place.put, ...(onState ? { onState } : {}),
});

/** Lets some minutes pass while the work is done. */
async function inMinutes<T>(work: () => Promise<T>): Promise<T> {
  vi.useFakeTimers();
  try {
    const result = work();
    result.catch(() => {}); // Told by the caller.
    await vi.advanceTimersByTimeAsync(300_000);
    return await result;
  } finally {
    vi.useRealTimers();
  }
}

test("all parts go, four at a time, the last one shorter, with few questions for addresses", async () => {
  const place = somePlace(10_500);
  const states: SendingState[] = [];
  expect(await sendFile(fileOf(10_500), options(place, (state) => states.push(state)))).toEqual({ fileId: "f1", recordingId: "r1" });
  expect(place.parts.size).toBe(11);
  expect(place.parts.get(11)).toBe(500);
  expect(place.most()).toBe(4);
  expect(place.asked).toHaveLength(1);
  expect(states.map(({ phase }) => phase)[0]).toBe("starting");
  expect(states.at(-1)).toMatchObject({ phase: "checking", sentBytes: 10_500, totalBytes: 10_500 });
  const sent = states.map(({ sentBytes }) => sentBytes);
  expect(sent.toSorted((a, b) => a - b)).toEqual(sent);
});

test("what the store has already isn't sent again", async () => {
  const put: number[] = [];
  const place = somePlace(5000, { received: [1, 2, 4], trouble: (part) => put.push(part) });
  await sendFile(fileOf(5000), options(place));
  expect(put.toSorted()).toEqual([3, 5]);
});

test("a lost connection is waited out, longer each time, and told", async () => {
  let failures = 0;
  const place = somePlace(1000, {
    trouble: () => {
      if ((failures += 1) <= 3) throw new Error("The connection broke off.");
    },
  });
  const phases = new Set<string>();
  await inMinutes(() => sendFile(fileOf(1000), options(place, ({ phase }) => phases.add(phase))));
  expect(failures).toBe(4);
  expect([...phases]).toEqual(["starting", "sending", "waiting", "checking"]);
});

test("an address that has run out is asked for again; a store that goes on refusing ends it", async () => {
  let refusals = 0;
  const once = somePlace(1000, {
    trouble: () => {
      if ((refusals += 1) === 1) throw new PartRefused(403);
    },
  });
  await inMinutes(() => sendFile(fileOf(1000), options(once)));
  expect(once.asked).toHaveLength(2);
  const always = somePlace(3000, {
    trouble: () => {
      throw new PartRefused(403);
    },
  });
  await expect(inMinutes(() => sendFile(fileOf(3000), options(always)))).rejects.toBeInstanceOf(PartRefused);
});

test("an upload that another tab completed meanwhile ends with its recording", async () => {
  const place = somePlace(2000, {
    trouble: () => {
      place.parts.set(1, PART).set(2, PART);
      throw new PartRefused(404);
    },
  });
  expect(await sendFile(fileOf(2000), options(place))).toMatchObject({ recordingId: "r1" });
});

test("stopped, it stops at once and sends nothing more", async () => {
  const controller = new AbortController();
  const place = somePlace(50_000, { trouble: (part) => part === 3 && controller.abort(new Error("stopped")) });
  await expect(sendFile(fileOf(50_000), { ...options(place), signal: controller.signal })).rejects.toThrow("stopped");
  const arrived = place.parts.size;
  await new Promise((resolve) => setTimeout(resolve, 30));
  expect(place.parts.size).toBe(arrived);
  expect(arrived).toBeLessThan(8);
});

test("given up before the server has answered, it is told what there is to throw away, and sends nothing", async () => {
  const controller = new AbortController();
  const place = somePlace(1000);
  const start = place.doors.start;
  place.doors.start = async (input) => {
    controller.abort(new Error("stopped"));
    return start(input);
  };
  let last: SendingState | undefined;
  await expect(sendFile(fileOf(1000), { ...options(place, (state) => (last = state)), signal: controller.signal })).rejects.toThrow("stopped");
  expect(last?.uploadId).toBe("u1");
  expect(place.parts.size).toBe(0);
});

test("a refusal of the server is passed on as it is said", async () => {
  const place = somePlace(1000);
  place.doors.start = async () => {
    throw new ApiProblem(413, "too_large", "The file has 12 GB.", []);
  };
  await expect(sendFile(fileOf(1000), options(place))).rejects.toThrow("The file has 12 GB.");
});

test("time left holds steady through a second without a byte, and follows a lasting change", () => {
  const meter = new RateMeter(100_000_000, 0, 0);
  let sent = 0;
  const run = (fromS: number, toS: number, perSecond: number) => {
    for (let second = fromS; second < toS; second += 1) meter.note((sent += perSecond), (second + 1) * 1000);
  };
  run(0, 2, 1_000_000);
  expect(meter.leftMs).toBeNull();
  run(2, 20, 1_000_000);
  // 80 MB at 1 MB a second.
  expect(meter.leftMs).toBeGreaterThan(78_000);
  expect(meter.leftMs).toBeLessThan(82_000);
  const before = meter.leftMs ?? 0;
  run(20, 21, 0);
  expect(Math.abs((meter.leftMs ?? 0) - before)).toBeLessThan(3000);
  run(21, 51, 500_000);
  // 65 MB at half a MB a second.
  expect(meter.leftMs).toBeGreaterThan(110_000);
  expect(meter.leftMs).toBeLessThan(140_000);
});

test.each([
  [4000, "a few seconds left"],
  [38_000, "about 40 s left"],
  [61_000, "about 1 min left"],
  [7_500_000, "about 2 h 5 min left"],
])("%i ms is %s", (ms, words) => {
  expect(formatLeft(ms)).toBe(words);
});
