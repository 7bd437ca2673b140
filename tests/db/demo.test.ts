import { orgId, personId, taskId } from "@/db/seeds/demo/ids";
import { statSync } from "node:fs";
import { beforeAll, describe, expect, test } from "vitest";
import { plannedStandings, type PlannedStanding } from "@/db/seeds/demo/history";
import { loadDemo } from "@/db/seeds/demo/load-demo";
import { DEMO_TASKS } from "@/db/seeds/demo/tasks";
import { leafHash } from "@/lib/core/ledger/merkle";
import { taskContentHashMatches, standingCode } from "../support/demo-checks";
import { levelCap } from "@/lib/core/tasks/level-cap";
import { today } from "@/lib/services/clock";
import { listStandings } from "@/lib/services/standing/list-standings";
import { testDatabase } from "../support/database";

const { db, owner } = testDatabase();
const put: string[] = [];

beforeAll(async () => {
  const putFile = async (of: { organisationId: string; subjectId: string; kind: string }, path: string) => {
    const storeKey = `${of.organisationId}/${of.subjectId}/${of.kind}`;
    put.push(storeKey);
    return { storeKey, sizeBytes: statSync(path).size };
  };
  expect(await loadDemo(owner(), { day: today(), passwordHash: "x", putFile })).toBe(true);
  expect(await loadDemo(owner(), { day: today(), passwordHash: "x", putFile }), "a second load does nothing").toBe(false);
});

// The plan in db/seeds/demo/history.ts is what the plate must show: computed from rows by the same services as in the product.
describe("every standing comes out as planned", () => {
  test.each(plannedStandings())("$apprentice on $task", async ({ apprentice, task, planned }: { apprentice: string; task: keyof typeof DEMO_TASKS; planned: PlannedStanding }) => {
    const { standing } = (await listStandings(db(), [personId(apprentice)], [taskId(task)])).of(personId(apprentice), taskId(task));
    expect(standingCode(standing)).toEqual(standingCode.planned(planned, task));
  });
});

test("every state of the bolt occurs", async () => {
  const seen = new Set<string>();
  for (const { apprentice, task } of plannedStandings()) {
    const { standing } = (await listStandings(db(), [personId(apprentice)], [taskId(task)])).of(personId(apprentice), taskId(task));
    seen.add(standing.held.kind === "nothing" ? standing.next : standing.held.kind);
    if (standing.held.kind !== "nothing" && ["ready", "booked", "not_yet"].includes(standing.next)) seen.add(`held and ${standing.next}`);
  }
  expect([...seen].toSorted()).toEqual(
    ["booked", "held and booked", "held and not_yet", "held and ready", "level", "not_open", "not_yet", "open", "practising", "ready", "recheck_due", "withdrawn"].toSorted(),
  );
});

test("the ledger is numbered without a gap and each entry hashes to its leaf", async () => {
  const entries = await db()("ledger_entries").where({ organisation_id: orgId("merrowdale") }).orderBy("leaf_index");
  expect(entries.map((entry) => Number(entry.leaf_index))).toEqual(entries.map((_, index) => index));
  expect(entries.every((entry) => leafHash(entry.canonical) === entry.leaf_hash)).toBe(true);
  expect(entries.length).toBeGreaterThan(100);
});

// Situation 5 of the demo's scenario: under 18, direct supervision on brakes, whatever else is held.
test("Asha is 17, so brakes stay at level 3 at most", async () => {
  const { rows } = await db().raw(`SELECT date_part('year', age(current_date, date_of_birth)) AS years FROM people WHERE id = ?`, [personId("asha")]);
  expect(Number(rows[0].years)).toBe(17);
  const many = Array.from({ length: 5 }, (_, index) => ({ vehicle: `V${index}`, assessorId: `a${index}` }));
  const cap = levelCap({ rule: DEMO_TASKS["front-brake-discs"].rule, prompted: false, metObservations: many, licences: [], ageYears: 17 });
  expect(cap.level).toBe(3);
});

test("frozen revisions carry the hash of their content", async () => {
  const revisions = await db()("task_revisions").select("content", "content_hash");
  expect(revisions.length).toBe(Object.keys(DEMO_TASKS).length + 1);
  expect(revisions.every(taskContentHashMatches)).toBe(true);
});

test("everybody and everything is marked as invented", async () => {
  expect(await db()("organisations").where({ is_demo: false })).toEqual([]);
  expect(put.length).toBeGreaterThan(10);
});
