import { expect, test } from "vitest";
import { isUnderWay, standingLabel } from "@/lib/core/standing/standing-label";
import { standingOf, type Progress, type SignedDecision } from "@/lib/core/standing/standing-of";
import { NEXT_STATES, type Held, type Next } from "@/lib/core/standing/types";

const TODAY = "2026-09-14";
const met = (more: Partial<SignedDecision> = {}): SignedDecision => ({
  outcome: "met",
  level: 3,
  signedOn: "2026-03-01",
  currentUntil: "2027-03-01",
  withdrawn: false,
  workChangedSince: false,
  ...more,
});
const notYet = (more: Partial<SignedDecision> = {}): SignedDecision => met({ outcome: "not_yet", level: null, currentUntil: null, ...more });
const OPEN: Progress = { hasModule: true, knowledgeMet: true, practiceRuns: 0, evidencePhotos: 0, isReady: false, isBooked: false };
const progress = (more: Partial<Progress> = {}): Progress => ({ ...OPEN, ...more });

// Source of what is held: product, "Task and sign-off" and "Words" (currency, re-check).
test.each<[string, SignedDecision[], Held]>([
  ["nothing signed", [], { kind: "nothing" }],
  ["only a not yet", [notYet()], { kind: "nothing" }],
  ["met and current", [met()], { kind: "level", level: 3, until: "2027-03-01" }],
  ["current on its last day", [met({ currentUntil: TODAY })], { kind: "level", level: 3, until: TODAY }],
  ["run out yesterday", [met({ currentUntil: "2026-09-13" })], { kind: "recheck_due", level: 3, because: "expired" }],
  ["the work changed", [met({ workChangedSince: true })], { kind: "recheck_due", level: 3, because: "work_changed" }],
  ["withdrawn", [met({ withdrawn: true })], { kind: "withdrawn", level: 3 }],
  ["withdrawn, and run out as well", [met({ withdrawn: true, currentUntil: "2026-01-01" })], { kind: "withdrawn", level: 3 }],
  ["a not yet later leaves the level", [met(), notYet({ signedOn: "2026-08-01" })], { kind: "level", level: 3, until: "2027-03-01" }],
  ["the newest level holds, be it lower", [met({ level: 4 }), met({ level: 2, currentUntil: "2027-08-01" })], { kind: "level", level: 2, until: "2027-08-01" }],
  ["re-checked after it ran out", [met({ currentUntil: "2026-01-01" }), met({ level: 4 })], { kind: "level", level: 4, until: "2027-03-01" }],
  ["re-checked after a withdrawal", [met({ withdrawn: true }), met()], { kind: "level", level: 3, until: "2027-03-01" }],
  ["the newest withdrawn: the one before doesn't come back", [met({ level: 2 }), met({ level: 4, withdrawn: true })], { kind: "withdrawn", level: 4 }],
])("held: %s", (_name, decisions, held) => {
  expect(standingOf(decisions, OPEN, TODAY).held).toEqual(held);
});

// Source of how far the next observation is: product, "Task and sign-off".
test.each<[string, SignedDecision[], Progress, Next]>([
  ["the module not known yet", [], progress({ knowledgeMet: false }), "not_open"],
  ["practised, the module not known yet", [], progress({ knowledgeMet: false, practiceRuns: 2 }), "not_open"],
  ["no module opens it", [], progress({ hasModule: false, knowledgeMet: false }), "open"],
  ["known", [], progress(), "open"],
  ["a run logged", [], progress({ practiceRuns: 1 }), "practising"],
  ["a photo attached", [], progress({ evidencePhotos: 1 }), "practising"],
  ["said to be ready", [], progress({ practiceRuns: 2, isReady: true }), "ready"],
  ["booked", [], progress({ practiceRuns: 2, isReady: true, isBooked: true }), "booked"],
  ["seen, not yet", [notYet()], progress({ practiceRuns: 2 }), "not_yet"],
  ["not yet, and ready again", [notYet()], progress({ practiceRuns: 3, isReady: true }), "ready"],
  ["the not yet was withdrawn", [notYet({ withdrawn: true })], progress({ practiceRuns: 2 }), "practising"],
  ["signed off: the runs led there", [met()], progress({ practiceRuns: 2 }), "open"],
  ["signed off after a not yet", [notYet(), met()], progress(), "open"],
  ["signed off, then not yet for the next level", [met(), notYet()], progress(), "not_yet"],
])("next: %s", (_name, decisions, given, next) => {
  expect(standingOf(decisions, given, TODAY).next).toBe(next);
});

// The two facts are independent: six things held by six states of the next observation, all said in words.
const HELD: [Held, string | null][] = [
  [{ kind: "nothing" }, null],
  [{ kind: "level", level: 3, until: "2026-12-01" }, "Signed off, level 3, until Tue 1 Dec 2026"],
  [{ kind: "recheck_due", level: 4, because: "expired" }, "Re-check due, was level 4"],
  [{ kind: "recheck_due", level: 4, because: "work_changed" }, "Re-check due, was level 4, the work changed"],
  [{ kind: "withdrawn", level: 2 }, "Withdrawn, was level 2"],
];
const NEXT_WORDS: Record<Next, string> = {
  not_open: "not open yet",
  open: "open",
  practising: "practising",
  ready: "ready to be observed",
  booked: "booked to be observed",
  not_yet: "not yet",
};
const pairs = HELD.flatMap(([held, words]) => NEXT_STATES.map((next) => ({ held, words, next, name: held.kind })));

test.each(pairs)("in words: $name and $next", ({ held, words, next }) => {
  const word = NEXT_WORDS[next];
  const expected = words === null ? word.charAt(0).toUpperCase() + word.slice(1) : isUnderWay(next) ? `${words} · ${word}` : words;
  expect(standingLabel({ held, next })).toBe(expected);
});

test("no two standings that differ in what is held sound the same", () => {
  const labels = HELD.map(([held]) => standingLabel({ held, next: "ready" }));
  expect(new Set(labels).size).toBe(labels.length);
  expect(standingLabel({ held: { kind: "level", level: 3, until: "2026-12-01" }, next: "ready" })).toBe(
    "Signed off, level 3, until Tue 1 Dec 2026 · ready to be observed",
  );
});
