import { expect, test } from "vitest";
import { heldBack, nextStop, type Stop } from "@/components/player/stops";

const stops: Stop[] = [
  { kind: "question", id: "q1", atMs: 5000 },
  { kind: "question", id: "q2", atMs: 9000 },
  { kind: "caution", id: "c2", atMs: 9000 },
];

test("the next stop is the nearest one ahead that isn't dealt with", () => {
  expect(nextStop(stops, new Set(), 0)?.id).toBe("q1");
  expect(nextStop(stops, new Set(["q1"]), 0)?.id).toBe("c2");
  expect(nextStop(stops, new Set(["q1", "c2"]), 0)?.id).toBe("q2");
  expect(nextStop(stops, new Set(), 9001)).toBeUndefined();
});

test("a stop exactly here still counts, and at one moment the caution comes before the question", () => {
  expect(nextStop(stops, new Set(), 5000)?.id).toBe("q1");
  expect(nextStop(stops, new Set(), 9000)?.id).toBe("c2");
});

test("a jump ends at the next stop or at the edge of what was played, whichever is nearer; back is free", () => {
  expect(heldBack(8000, 20_000, stops[0])).toBe(5000);
  expect(heldBack(8000, 6000, undefined)).toBe(6000);
  expect(heldBack(1000, 6000, stops[0])).toBe(1000);
  expect(heldBack(-50, 6000, undefined)).toBe(0);
});
