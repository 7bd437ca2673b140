import { expect, test } from "vitest";
import { SpanRecorder } from "@/components/player/span-recorder";

test("play is gathered, a jump begins a new span, a hidden page doesn't count", () => {
  const recorder = new SpanRecorder();
  for (const at of [0, 250, 500, 750]) recorder.look(at, true);
  recorder.look(20_000, true);
  recorder.look(20_250, true);
  recorder.look(20_500, false);
  recorder.look(21_000, true);
  expect(recorder.take()).toEqual([
    [0, 750],
    [20_000, 20_250],
  ]);
});

test("taking leaves no gap and no double, and what could not be sent comes back", () => {
  const recorder = new SpanRecorder();
  recorder.look(0, true);
  recorder.look(1000, true);
  const first = recorder.take();
  recorder.look(2000, true);
  recorder.putBack(first);
  expect(recorder.take()).toEqual([
    [0, 1000],
    [1000, 2000],
  ]);
});

test("going back begins a new span", () => {
  const recorder = new SpanRecorder();
  for (const at of [5000, 5500, 3000, 3500]) recorder.look(at, true);
  expect(recorder.take()).toEqual([
    [5000, 5500],
    [3000, 3500],
  ]);
});
